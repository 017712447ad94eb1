import { Body, Controller, Get, HttpCode, Param, Post, Query } from '@nestjs/common';
import {
  type AlertsQuery,
  type CloseAlertRequest,
  type SetAsideRequest,
  type WireAlert,
  alertsQuerySchema,
  closeAlertSchema,
  setAsideSchema,
  terminalsWhere,
} from '@stubpost/shared';
import { Clock } from '../common/clock';
import { CurrentPerson, Permit } from '../common/decorators';
import type { CurrentPersonFacts } from '../common/signed-in';
import { ZodPipe } from '../common/zod.pipe';
import { AlertDesk } from './alert-desk';
import { wireAlertOf } from './alert-record';
import { AlertReadModel } from './alert.read-model';

@Controller('api/alerts')
export class AlertsController {
  constructor(
    private readonly alerts: AlertReadModel,
    private readonly desk: AlertDesk,
    private readonly clock: Clock,
  ) {}

  @Get()
  @Permit('alerts.read', { terminal: 'query.terminal' })
  list(
    @Query(new ZodPipe(alertsQuerySchema)) query: AlertsQuery,
    @CurrentPerson() person: CurrentPersonFacts,
  ): Promise<WireAlert[]> {
    const terminals = query.terminal === undefined ? terminalsWhere(person, 'alerts.read') : [query.terminal];
    return this.alerts.list(terminals, query.state);
  }

  @Post(':id/taking')
  @HttpCode(200)
  @Permit('alerts.act')
  async take(@Param('id') alertId: string, @CurrentPerson() person: CurrentPersonFacts): Promise<WireAlert> {
    return wireAlertOf(await this.desk.take({ alertId, person, now: this.clock.now() }));
  }

  @Post(':id/setting-aside')
  @HttpCode(200)
  @Permit('alerts.act')
  async setAside(
    @Param('id') alertId: string,
    @Body(new ZodPipe(setAsideSchema)) request: SetAsideRequest,
    @CurrentPerson() person: CurrentPersonFacts,
  ): Promise<WireAlert> {
    return wireAlertOf(await this.desk.setAside({ alertId, person, now: this.clock.now() }, request));
  }

  @Post(':id/closing')
  @HttpCode(200)
  @Permit('alerts.act')
  async close(
    @Param('id') alertId: string,
    @Body(new ZodPipe(closeAlertSchema)) request: CloseAlertRequest,
    @CurrentPerson() person: CurrentPersonFacts,
  ): Promise<WireAlert> {
    return wireAlertOf(await this.desk.close({ alertId, person, now: this.clock.now() }, request));
  }
}
