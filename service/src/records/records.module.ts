import { Module } from '@nestjs/common';
import { EntryLog } from './entry-log';

/** The sealed log of everything that was recorded. */
@Module({ providers: [EntryLog], exports: [EntryLog] })
export class RecordsModule {}
