import { Module } from '@nestjs/common';
import { AuthModule } from '../auth/auth.module';
import { DutyModule } from '../duty/duty.module';
import { MessagesModule } from '../messages/messages.module';
import { TerminalsModule } from '../terminals/terminals.module';
import { TurnStoreModule } from '../turns/turn-store.module';
import { AlertDesk } from './alert-desk';
import { AlertEscalation } from './alert-escalation';
import { AlertKeeper } from './alert-keeper';
import { AlertQualityController } from './alert-quality.controller';
import { AlertQualityReadModel } from './alert-quality.read-model';
import { AlertQualityService } from './alert-quality.service';
import { AlertTeller } from './alert-teller';
import { AlertReadModel } from './alert.read-model';
import { AlertRepository } from './alert.repository';
import { AlertsController } from './alerts.controller';
import { LatenessRules } from './lateness-rules';
import { TakenLinks } from './taken-links';
import { TakingsController } from './takings.controller';
import { WatchRepository } from './watch.repository';

/** Alerts: raising and clearing them, and what people do about them. */
@Module({
  imports: [AuthModule, DutyModule, MessagesModule, TerminalsModule, TurnStoreModule],
  controllers: [AlertQualityController, AlertsController, TakingsController],
  providers: [
    AlertDesk,
    AlertEscalation,
    AlertKeeper,
    AlertQualityReadModel,
    AlertQualityService,
    AlertReadModel,
    AlertRepository,
    AlertTeller,
    LatenessRules,
    TakenLinks,
    WatchRepository,
  ],
  exports: [AlertEscalation, AlertKeeper, AlertReadModel, AlertRepository, LatenessRules, WatchRepository],
})
export class AlertsModule {}
