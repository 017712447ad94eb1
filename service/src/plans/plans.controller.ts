import { Body, Controller, Get, Header, Param, Post } from '@nestjs/common';
import { type CreatePlanRequest, type WireStepPlan, createPlanSchema } from '@stubpost/shared';
import { Access } from '../common/access';
import { Clock } from '../common/clock';
import { CurrentPerson, Permit } from '../common/decorators';
import { Refusal } from '../common/refusal';
import type { CurrentPersonFacts } from '../common/signed-in';
import { ZodPipe } from '../common/zod.pipe';
import { TerminalsReadModel } from '../terminals/terminals.read-model';
import { wirePlanOf } from './plan.mapper';
import { PlansService } from './plans.service';

@Controller('api')
export class PlansController {
  constructor(
    private readonly plans: PlansService,
    private readonly terminals: TerminalsReadModel,
    private readonly access: Access,
    private readonly clock: Clock,
  ) {}

  @Get('plans/:id')
  @Permit('plans.read')
  @Header('Cache-Control', 'private, max-age=31536000, immutable')
  async one(@Param('id') id: string, @CurrentPerson() person: CurrentPersonFacts): Promise<WireStepPlan> {
    const plan = await this.plans.find(id);
    if (plan === null) throw new Refusal({ code: 'plan.unknown', message: 'there is no such step plan' });
    this.access.require(person, 'plans.read', plan.terminalCode);
    return wirePlanOf(plan);
  }

  @Get('terminals/:code/plans')
  @Permit('plans.read', { terminal: 'param.code' })
  async list(@Param('code') code: string): Promise<WireStepPlan[]> {
    await this.terminals.require(code);
    const plans = await this.plans.listAt(code, this.clock.now());
    return plans.map(wirePlanOf);
  }

  @Post('terminals/:code/plans')
  @Permit('plans.edit', { terminal: 'param.code' })
  async create(
    @Param('code') terminalCode: string,
    @Body(new ZodPipe(createPlanSchema)) request: CreatePlanRequest,
    @CurrentPerson() person: CurrentPersonFacts,
  ): Promise<WireStepPlan> {
    await this.terminals.require(terminalCode);
    const plan = await this.plans.create({
      terminalCode,
      request,
      authorName: person.name,
      now: this.clock.now(),
    });
    return wirePlanOf(plan);
  }
}
