import { Module } from '@nestjs/common';
import { TerminalsModule } from '../terminals/terminals.module';
import { DeparturesReadModel } from './departures.read-model';
import { HistoryController } from './history.controller';
import { HistoryImportsRepository } from './history-imports.repository';
import { HistoryImportsService } from './history-imports.service';
import { OnTimeService } from './on-time.service';

/** How many left on time, and the tables of past departures that help to say so. */
@Module({
  imports: [TerminalsModule],
  controllers: [HistoryController],
  providers: [DeparturesReadModel, HistoryImportsRepository, HistoryImportsService, OnTimeService],
})
export class HistoryModule {}
