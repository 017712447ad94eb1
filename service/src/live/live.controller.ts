import { Controller, Get, Headers, Query, Res } from '@nestjs/common';
import { type LiveQuery, liveQuerySchema } from '@stubpost/shared';
import type { Response } from 'express';
import { CurrentPerson, Permit } from '../common/decorators';
import type { CurrentPersonFacts } from '../common/signed-in';
import { ZodPipe } from '../common/zod.pipe';
import { parseLastEventId } from './live-event';
import { LiveHub } from './live-hub';

@Controller('api/live')
export class LiveController {
  constructor(private readonly hub: LiveHub) {}

  /** The response is held by hand, so that one buffer serves all readers and the ids are those of the changes. */
  @Get()
  @Permit('board.read', { terminal: 'query.terminal' })
  listen(
    @Query(new ZodPipe(liveQuerySchema)) query: LiveQuery,
    @Headers('last-event-id') lastEventId: string | undefined,
    @CurrentPerson() person: CurrentPersonFacts,
    @Res() response: Response,
  ): void {
    const facts = { terminalCode: query.terminal, sessionId: person.sessionId };
    this.hub.open(facts, response, parseLastEventId(lastEventId ?? query.lastEventId));
  }
}
