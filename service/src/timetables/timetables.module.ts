import { Module } from '@nestjs/common';
import { MulterModule } from '@nestjs/platform-express';
import { Config } from '../config/config';
import { TerminalsModule } from '../terminals/terminals.module';
import { TurnsModule } from '../turns/turns.module';
import { feedLimits } from './feed-limits';
import { FeedReaders, feedReadersHere } from './feed-readers';
import { TimetableActivations } from './timetable-activations.service';
import { TimetableContents } from './timetable-contents';
import { TimetableDaysJob } from './timetable-days.job';
import { TimetableDays } from './timetable-days.service';
import { TimetableImports } from './timetable-imports.service';
import { TimetableTurns } from './timetable-turns.service';
import { TimetablesController } from './timetables.controller';
import { TimetablesReadModel } from './timetables.read-model';
import { TimetablesRepository } from './timetables.repository';
import { incomingFolder, UploadStore } from './upload-store';

/** Timetables: bringing them in, deriving their turns, making them the running one. */
@Module({
  imports: [
    TerminalsModule,
    TurnsModule,
    MulterModule.registerAsync({
      inject: [Config],
      useFactory: (config: Config) => ({
        dest: incomingFolder(config),
        limits: { fileSize: feedLimits.zipBytes, files: 1, fields: 10, fieldSize: 10_000 },
        defParamCharset: 'utf8',
      }),
    }),
  ],
  controllers: [TimetablesController],
  providers: [
    { provide: FeedReaders, useFactory: feedReadersHere },
    TimetableActivations,
    TimetableContents,
    TimetableDays,
    TimetableDaysJob,
    TimetableImports,
    TimetableTurns,
    TimetablesReadModel,
    TimetablesRepository,
    UploadStore,
  ],
  exports: [TimetableActivations, TimetableDays, TimetableImports],
})
export class TimetablesModule {}
