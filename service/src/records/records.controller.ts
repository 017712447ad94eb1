import path from 'node:path';
import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { Controller, Get, Logger, Query, Res } from '@nestjs/common';
import {
  type LogQuery,
  type LogStateQuery,
  type WireDailyHead,
  type WireLogState,
  formatInstant,
  logQuerySchema,
  logStateQuerySchema,
  terminalsWhere,
} from '@stubpost/shared';
import type { Response } from 'express';
import { CurrentPerson, Permit } from '../common/decorators';
import type { CurrentPersonFacts } from '../common/signed-in';
import { ZodPipe } from '../common/zod.pipe';
import { ChainCheck } from './chain-check.service';
import { DailyHeads } from './daily-heads.service';
import { LogReadModel } from './log.read-model';
import { LogExport } from './log-export';

/** Where the build puts the checker: beside the compiled service, also when this runs from its sources. */
const checkerFile = path.join(__dirname, '../../dist/check-log.mjs');

/** The sealed log for whoever has to look at it: to take along, to compare, and to check elsewhere. */
@Controller('api/records')
export class RecordsController {
  private readonly logger = new Logger(RecordsController.name);

  constructor(
    private readonly exports: LogExport,
    private readonly heads: DailyHeads,
    private readonly log: LogReadModel,
    private readonly chain: ChainCheck,
  ) {}

  @Get('log')
  @Permit('records.read')
  async download(
    @Query(new ZodPipe(logQuerySchema)) query: LogQuery,
    @CurrentPerson() person: CurrentPersonFacts,
    @Res() response: Response,
  ): Promise<void> {
    const range = await this.exports.rangeOf(query);
    const lines = this.exports.lines(range, terminalsWhere(person, 'records.read'));
    response.setHeader('Content-Type', 'application/x-ndjson; charset=utf-8');
    response.setHeader('Content-Disposition', `attachment; filename="${nameOf(query)}"`);
    try {
      await pipeline(Readable.from(lines), response);
    } catch (error) {
      // A reader who goes away is no fault; a file that breaks off shows as cut short when it is checked.
      this.logger.debug(`the log was not taken to its end: ${String(error)}`);
    }
  }

  @Get('heads')
  @Permit('records.read')
  async dailyHeads(@Query(new ZodPipe(logQuerySchema)) query: LogQuery): Promise<WireDailyHead[]> {
    const published = await this.heads.published(query);
    const open = await this.heads.open();
    const isAsked = open !== null && (query.from ?? '') <= open.date && open.date <= (query.to ?? open.date);
    return [
      ...published.map((head) => ({ ...head, publishedAt: formatInstant(head.publishedAt) })),
      ...(isAsked ? [{ ...open, publishedAt: null }] : []),
    ];
  }

  @Get('state')
  @Permit('records.read')
  async state(@Query(new ZodPipe(logStateQuerySchema)) query: LogStateQuery): Promise<WireLogState> {
    if (query.again === 'true') void this.chain.run().catch(() => undefined);
    const { checkedAt, ...chain } = this.chain.report();
    const head = await this.log.newest();
    return {
      chain: { ...chain, checkedAt: checkedAt === null ? null : formatInstant(checkedAt) },
      entries: head?.sequence ?? 0,
      head:
        head === null
          ? null
          : {
              sequence: head.sequence,
              hash: head.hash,
              receivedAt: formatInstant(Number(head.receivedAt)),
            },
    };
  }

  @Get('checker')
  @Permit('records.read')
  checker(@Res() response: Response): void {
    response.setHeader('Content-Type', 'text/javascript; charset=utf-8');
    response.setHeader('Content-Disposition', 'attachment; filename="check-log.mjs"');
    response.sendFile(checkerFile);
  }
}

/** A name that says what is in the file: `stubpost-log-2026-03-01-2026-03-03.ndjson`. */
function nameOf({ from, to }: LogQuery): string {
  if (from === undefined && to === undefined) return 'stubpost-log.ndjson';
  return `stubpost-log-${from ?? 'start'}-${to ?? 'now'}.ndjson`;
}
