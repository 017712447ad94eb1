import { Module } from '@nestjs/common';
import { TerminalsModule } from '../terminals/terminals.module';
import { TurnStoreModule } from '../turns/turn-store.module';
import { AlertDesk } from './alert-desk';
import { AlertKeeper } from './alert-keeper';
import { AlertQualityController } from './alert-quality.controller';
import { AlertQualityReadModel } from './alert-quality.read-model';
import { AlertQualityService } from './alert-quality.service';
import { AlertReadModel } from './alert.read-model';
import { AlertRepository } from './alert.repository';
import { AlertsController } from './alerts.controller';
import { LatenessRules } from './lateness-rules';
import { WatchRepository } from './watch.repository';

/** Alerts: raising and clearing them, and what people do about them. */
@Module({
  imports: [TerminalsModule, TurnStoreModule],
  controllers: [AlertQualityController, AlertsController],
  providers: [
    AlertDesk,
    AlertKeeper,
    AlertQualityReadModel,
    AlertQualityService,
    AlertReadModel,
    AlertRepository,
    LatenessRules,
    WatchRepository,
  ],
  exports: [AlertKeeper, AlertReadModel, AlertRepository, LatenessRules, WatchRepository],
})
export class AlertsModule {}
