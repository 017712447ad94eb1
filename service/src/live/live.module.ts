import { Module } from '@nestjs/common';
import { AlertsModule } from '../alerts/alerts.module';
import { AuthModule } from '../auth/auth.module';
import { TurnsModule } from '../turns/turns.module';
import { ChangeHistory } from './change-history';
import { ChangePruningJob } from './change-pruning.job';
import { LiveController } from './live.controller';
import { LiveHub } from './live-hub';
import { LiveObjects } from './live-objects';

/** The live stream of a terminal's changes. */
@Module({
  imports: [AlertsModule, AuthModule, TurnsModule],
  controllers: [LiveController],
  providers: [ChangeHistory, ChangePruningJob, LiveHub, LiveObjects],
  exports: [ChangeHistory, LiveHub],
})
export class LiveModule {}
