import { Module } from '@nestjs/common';
import { MessagesModule } from '../messages/messages.module';
import { HealthController } from './health.controller';
import { SweepHeartbeat } from './sweep-heartbeat';
import { SweepWatchdog } from './sweep-watchdog';
import { SweepWatchdogJob } from './sweep-watchdog.job';

/** Whether the service is well. */
@Module({
  imports: [MessagesModule],
  controllers: [HealthController],
  providers: [SweepHeartbeat, SweepWatchdog, SweepWatchdogJob],
  exports: [SweepHeartbeat],
})
export class HealthModule {}
