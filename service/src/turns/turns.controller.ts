import { Body, Controller, Get, HttpStatus, Param, Post, Res } from '@nestjs/common';
import {
  type CreateTurnRequest,
  type RecordEntryRequest,
  type WireEntry,
  createTurnSchema,
  recordEntrySchema,
} from '@stubpost/shared';
import type { Response } from 'express';
import { Clock } from '../common/clock';
import { CurrentPerson, Permit } from '../common/decorators';
import type { CurrentPersonFacts } from '../common/signed-in';
import { ZodPipe } from '../common/zod.pipe';
import { ExtraTurns } from './extra-turns.service';
import { sendJson } from './send-json';
import { TurnViews } from './turn-views';
import { TurnsService } from './turns.service';

@Controller('api/turns')
export class TurnsController {
  constructor(
    private readonly turns: TurnsService,
    private readonly extras: ExtraTurns,
    private readonly views: TurnViews,
    private readonly clock: Clock,
  ) {}

  @Post()
  @Permit('turns.create', { terminal: 'body.terminal' })
  async create(
    @Body(new ZodPipe(createTurnSchema)) request: CreateTurnRequest,
    @Res() response: Response,
  ): Promise<void> {
    const now = this.clock.now();
    const file = await this.extras.create(request, now);
    sendJson(response, HttpStatus.CREATED, await this.views.jsonOf(file, now));
  }

  @Get(':id')
  @Permit('board.read')
  async one(
    @Param('id') id: string,
    @CurrentPerson() person: CurrentPersonFacts,
    @Res() response: Response,
  ): Promise<void> {
    const file = await this.turns.require(id, person);
    sendJson(response, HttpStatus.OK, await this.views.jsonOf(file, this.clock.now()));
  }

  @Get(':id/entries')
  @Permit('entries.read')
  entries(@Param('id') id: string, @CurrentPerson() person: CurrentPersonFacts): Promise<WireEntry[]> {
    return this.turns.entriesOf(id, person);
  }

  @Post(':id/entries')
  @Permit('entries.record')
  async record(
    @Param('id') turnId: string,
    @Body(new ZodPipe(recordEntrySchema)) request: RecordEntryRequest,
    @CurrentPerson() actor: CurrentPersonFacts,
    @Res() response: Response,
  ): Promise<void> {
    const now = this.clock.now();
    const { isNew, sequence, hash, file } = await this.turns.recordEntry({ turnId, request, actor, now });
    const turn = await this.views.jsonOf(file, now);
    const status = isNew ? HttpStatus.CREATED : HttpStatus.OK;
    sendJson(response, status, `{"sequence":${sequence},"hash":"${hash}","turn":${turn}}`);
  }
}
