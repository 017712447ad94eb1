import { type DynamicModule, Global, Module } from '@nestjs/common';
import { Config } from './config';

/** Gives the configuration to every module. */
@Global()
@Module({})
export class ConfigModule {
  static withConfig(config: Config): DynamicModule {
    return {
      module: ConfigModule,
      providers: [{ provide: Config, useValue: config }],
      exports: [Config],
    };
  }
}
