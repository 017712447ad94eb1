import { type DynamicModule, Global, Module } from '@nestjs/common';
import { Access } from './access';
import { Clock } from './clock';
import { Restarter } from './restarter';

/** What every area uses: the clock and the policy's doorkeeper. */
@Global()
@Module({})
export class CommonModule {
  static withClock(clock: Clock): DynamicModule {
    return {
      module: CommonModule,
      providers: [{ provide: Clock, useValue: clock }, Access, Restarter],
      exports: [Clock, Access, Restarter],
    };
  }
}
