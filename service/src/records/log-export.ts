import { setImmediate as breathe } from 'node:timers/promises';
import { Injectable } from '@nestjs/common';
import { ALL_TERMINALS, type Instant, type LogQuery, addDays, formatLogLine } from '@stubpost/shared';
import { DailyHeads } from './daily-heads.service';
import { LogReadModel } from './log.read-model';

/** Entries read and written in one go: some 200 kB, a few milliseconds. */
const sliceLength = 250;

/** Running numbers from which to which, both included; empty when `last` is smaller. */
export interface LogRange {
  first: number;
  last: number;
}

/** Writes the log out for the checker. */
@Injectable()
export class LogExport {
  constructor(
    private readonly log: LogReadModel,
    private readonly heads: DailyHeads,
  ) {}

  /**
   * The entries to write for some days of receipt. It begins right after a published head and ends with one (or with
   * the log), so that it can be checked by itself: whole days, without a gap, and everything received on them.
   */
  async rangeOf({ from, to }: LogQuery): Promise<LogRange> {
    const newest = (await this.log.newest())?.sequence ?? 0;
    if (from === undefined && to === undefined) return { first: 1, last: newest };
    const received = await this.log.numbersReceived(startOf(from), endOf(to));
    if (received === null) return { first: 1, last: 0 };
    const { before } = await this.heads.around(received.first);
    const { from: after } = await this.heads.around(received.last);
    return {
      first: from === undefined ? 1 : (before?.sequence ?? 0) + 1,
      last: to === undefined ? newest : (after?.sequence ?? newest),
    };
  }

  /**
   * The lines of a range, some at a time. Bodies stay in where the reader may see the terminal; elsewhere only the
   * envelope leaves the house, with which the chain still checks.
   */
  async *lines(range: LogRange, terminals: readonly string[]): AsyncGenerator<string> {
    const isForAll = terminals.includes(ALL_TERMINALS);
    for (let next = range.first; next <= range.last;) {
      const count = Math.min(sliceLength, range.last - next + 1);
      const entries = await this.log.entriesFrom(next, count);
      const lines = entries.map((entry) => {
        const { sequence, id, receivedAt, previousHash, bodyHash, hash } = entry;
        const body = isForAll || terminals.includes(entry.terminalCode) ? entry.body : null;
        return `${formatLogLine({ sequence, id, receivedAt, previousHash, bodyHash, hash, body })}\n`;
      });
      const last = entries.at(-1);
      if (last === undefined) return;
      yield lines.join('');
      next = last.sequence + 1;
      await breathe();
    }
  }
}

const startOf = (day: string | undefined): Instant =>
  day === undefined ? 0 : Date.parse(`${day}T00:00:00Z`);
const endOf = (day: string | undefined): Instant =>
  day === undefined ? Number.MAX_SAFE_INTEGER : Date.parse(`${addDays(day, 1)}T00:00:00Z`);
