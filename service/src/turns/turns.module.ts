import { Module } from '@nestjs/common';
import { AlertsModule } from '../alerts/alerts.module';
import { PeopleModule } from '../people/people.module';
import { PlansModule } from '../plans/plans.module';
import { RecordsModule } from '../records/records.module';
import { SetsModule } from '../sets/sets.module';
import { TerminalsModule } from '../terminals/terminals.module';
import { CrewCarrier } from './crew-carrier';
import { EntryRecorder } from './entry-recorder';
import { RecordingRights } from './recording-rights';
import { TurnChanges } from './turn-changes';
import { TurnFiles } from './turn-files';
import { TurnStoreModule } from './turn-store.module';
import { TurnViews } from './turn-views';
import { TurnsController } from './turns.controller';
import { TurnsService } from './turns.service';

/** Turns: what was planned, what has happened, and the board that shows it. */
@Module({
  imports: [
    AlertsModule,
    PeopleModule,
    PlansModule,
    RecordsModule,
    SetsModule,
    TerminalsModule,
    TurnStoreModule,
  ],
  controllers: [TurnsController],
  providers: [CrewCarrier, EntryRecorder, RecordingRights, TurnChanges, TurnFiles, TurnViews, TurnsService],
  exports: [TurnFiles, TurnViews, TurnsService],
})
export class TurnsModule {}
