import { Module } from '@nestjs/common';
import { AlertsModule } from '../alerts/alerts.module';
import { HealthModule } from '../health/health.module';
import { PeopleModule } from '../people/people.module';
import { PlansModule } from '../plans/plans.module';
import { RecordsModule } from '../records/records.module';
import { SetsModule } from '../sets/sets.module';
import { TerminalsModule } from '../terminals/terminals.module';
import { BoardController } from './board.controller';
import { CorrectionsController } from './corrections.controller';
import { CorrectionsReadModel } from './corrections.read-model';
import { CrewCarrier } from './crew-carrier';
import { EntryRecorder } from './entry-recorder';
import { ExtraTurns } from './extra-turns.service';
import { RecordingRights } from './recording-rights';
import { SweepableTurns } from './sweepable-turns.read-model';
import { TurnBoardReadModel } from './turn-board.read-model';
import { TurnBoards } from './turn-boards';
import { TurnChanges } from './turn-changes';
import { TurnFiles } from './turn-files';
import { TurnFinder } from './turn-finder.read-model';
import { TurnOpener } from './turn-opener';
import { TurnStoreModule } from './turn-store.module';
import { TurnSweepJob } from './turn-sweep.job';
import { TurnSweep } from './turn-sweep.service';
import { TurnViews } from './turn-views';
import { TurnsController } from './turns.controller';
import { TurnsService } from './turns.service';

/** Turns: what was planned, what has happened, and the board that shows it. */
@Module({
  imports: [
    AlertsModule,
    HealthModule,
    PeopleModule,
    PlansModule,
    RecordsModule,
    SetsModule,
    TerminalsModule,
    TurnStoreModule,
  ],
  controllers: [BoardController, CorrectionsController, TurnsController],
  providers: [
    CorrectionsReadModel,
    CrewCarrier,
    EntryRecorder,
    ExtraTurns,
    RecordingRights,
    SweepableTurns,
    TurnBoardReadModel,
    TurnBoards,
    TurnChanges,
    TurnFiles,
    TurnFinder,
    TurnOpener,
    TurnSweep,
    TurnSweepJob,
    TurnViews,
    TurnsService,
  ],
  exports: [TurnFiles, TurnOpener, TurnSweep, TurnViews, TurnsService],
})
export class TurnsModule {}
