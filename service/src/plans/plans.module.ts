import { Module } from '@nestjs/common';
import { TerminalsModule } from '../terminals/terminals.module';
import { TurnStoreModule } from '../turns/turn-store.module';
import { PlanRepository } from './plan.repository';
import { PlansController } from './plans.controller';
import { PlansService } from './plans.service';

/** Step plans of terminals, by version. */
@Module({
  imports: [TerminalsModule, TurnStoreModule],
  controllers: [PlansController],
  providers: [PlanRepository, PlansService],
  exports: [PlansService],
})
export class PlansModule {}
