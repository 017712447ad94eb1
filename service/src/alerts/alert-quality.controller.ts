import { Controller, Get, Query } from '@nestjs/common';
import { type AlertQualityQuery, type WireAlertQuality, alertQualityQuerySchema } from '@stubpost/shared';
import { Permit } from '../common/decorators';
import { ZodPipe } from '../common/zod.pipe';
import { AlertQualityService } from './alert-quality.service';

/** How useful the alerts of a desk were. */
@Controller('api/alerts/quality')
export class AlertQualityController {
  constructor(private readonly quality: AlertQualityService) {}

  @Get()
  @Permit('history.read', { terminal: 'query.terminal' })
  answer(@Query(new ZodPipe(alertQualityQuerySchema)) query: AlertQualityQuery): Promise<WireAlertQuality> {
    return this.quality.answer(query);
  }
}
