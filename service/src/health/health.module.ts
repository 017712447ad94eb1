import { Module } from '@nestjs/common';
import { HealthController } from './health.controller';
import { SweepHeartbeat } from './sweep-heartbeat';

/** Whether the service is well. */
@Module({
  controllers: [HealthController],
  providers: [SweepHeartbeat],
  exports: [SweepHeartbeat],
})
export class HealthModule {}
