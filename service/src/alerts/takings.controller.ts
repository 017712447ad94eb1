import { Controller, Get, HttpCode, Param, Post } from '@nestjs/common';
import type { WireTaking } from '@stubpost/shared';
import { Clock } from '../common/clock';
import { Public } from '../common/decorators';
import { TakenLinks } from './taken-links';

/** The link in a message about an alert: looking changes nothing, the button takes the alert. */
@Controller('api/takings')
export class TakingsController {
  constructor(
    private readonly links: TakenLinks,
    private readonly clock: Clock,
  ) {}

  @Get(':token')
  @Public()
  look(@Param('token') token: string): Promise<WireTaking> {
    return this.links.look(token, this.clock.now());
  }

  @Post(':token')
  @Public()
  @HttpCode(200)
  take(@Param('token') token: string): Promise<WireTaking> {
    return this.links.take(token, this.clock.now());
  }
}
