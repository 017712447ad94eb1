import { Controller, Get, Query, Req, Res } from '@nestjs/common';
import {
  type BoardQuery,
  type FindQuery,
  type FoundTurn,
  boardQuerySchema,
  findQuerySchema,
} from '@stubpost/shared';
import type { Request, Response } from 'express';
import { Clock } from '../common/clock';
import { Permit } from '../common/decorators';
import { ZodPipe } from '../common/zod.pipe';
import { TurnBoards } from './turn-boards';
import { TurnFinder } from './turn-finder.read-model';

@Controller('api')
export class BoardController {
  constructor(
    private readonly boards: TurnBoards,
    private readonly finder: TurnFinder,
    private readonly clock: Clock,
  ) {}

  @Get('board')
  @Permit('board.read', { terminal: 'query.terminal' })
  async board(
    @Query(new ZodPipe(boardQuerySchema)) query: BoardQuery,
    @Req() request: Request,
    @Res() response: Response,
  ): Promise<void> {
    const board = await this.boards.find(query, this.clock.now());
    const { etag } = board.facts;
    response.setHeader('ETag', etag);
    response.setHeader('Cache-Control', 'private, no-cache');
    response.setHeader('Vary', 'Accept-Encoding');
    if (isKnown(request.headers['if-none-match'], etag)) {
      response.status(304).end();
      return;
    }
    response.setHeader('Content-Type', 'application/json; charset=utf-8');
    const isPacked = request.acceptsEncodings('gzip') === 'gzip';
    if (isPacked) response.setHeader('Content-Encoding', 'gzip');
    const body = isPacked ? await board.gzip : board.body;
    response.setHeader('Content-Length', body.length);
    response.status(200).end(body);
  }

  @Get('find')
  @Permit('board.read', { terminal: 'query.terminal' })
  find(@Query(new ZodPipe(findQuerySchema)) query: FindQuery): Promise<FoundTurn[]> {
    return this.finder.find(query, this.clock.now());
  }
}

/** Whether one of the tags that the caller holds is this one. */
function isKnown(header: string | undefined, etag: string): boolean {
  if (header === undefined) return false;
  return header.split(',').some((tag) => tag.trim() === etag || tag.trim() === '*');
}
