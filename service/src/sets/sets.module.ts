import { Module } from '@nestjs/common';
import { TurnStoreModule } from '../turns/turn-store.module';
import { SetRepository } from './set.repository';
import { SetsController } from './sets.controller';
import { SetsService } from './sets.service';

/** Equipment sets and their units. */
@Module({
  imports: [TurnStoreModule],
  controllers: [SetsController],
  providers: [SetRepository, SetsService],
  exports: [SetsService],
})
export class SetsModule {}
