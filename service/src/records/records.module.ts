import { Module } from '@nestjs/common';
import { ChainCheck } from './chain-check.service';
import { DailyHeads } from './daily-heads.service';
import { EntryLog } from './entry-log';
import { LogReadModel } from './log.read-model';
import { LogExport } from './log-export';
import { RecordsController } from './records.controller';
import { RecordsJob } from './records.job';

/** The sealed log of everything that was recorded: written, exported, and checked. */
@Module({
  controllers: [RecordsController],
  providers: [ChainCheck, DailyHeads, EntryLog, LogExport, LogReadModel, RecordsJob],
  exports: [EntryLog],
})
export class RecordsModule {}
