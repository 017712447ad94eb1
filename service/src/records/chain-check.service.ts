import { setImmediate as breathe } from 'node:timers/promises';
import { Injectable, Logger } from '@nestjs/common';
import {
  type CHAIN_STATES,
  type Instant,
  LogCheck,
  type LogHead,
  columnsOf,
  formatEntryFault,
  formatLogLine,
} from '@stubpost/shared';
import { Clock } from '../common/clock';
import { DailyHeads } from './daily-heads.service';
import { LogReadModel, type StoredEntry } from './log.read-model';
import { sha256 } from './sha256';

/** Entries checked in one go: two or three milliseconds, then everybody else has their turn. */
const sliceLength = 50;
const mostFaultsTold = 50;

/** Something wrong with the log, in words; `sequence` where one entry can be named. */
export interface ChainFault {
  sequence: number | null;
  words: string;
}

/** What the check of the server's own log has come to. */
export interface ChainReport {
  state: (typeof CHAIN_STATES)[number];
  checkedTo: number;
  checkedAt: Instant | null;
  tookMilliseconds: number | null;
  faults: ChainFault[];
  faultCount: number;
  /** How far a check has come that is running now. */
  runningTo: number | null;
}

/** A check that has read up to some number, and may read on from there. */
interface Reading {
  check: LogCheck;
  columns: ChainFault[];
  next: number;
  tookMilliseconds: number;
}

/**
 * Checks the log in the database from no. 1, with the very check that the stand-alone checker does, and the columns
 * that repeat what the bodies say, the published heads, and that no number is given out without an entry. Works in
 * small slices between requests. While the log is whole, new entries are checked as they come.
 */
@Injectable()
export class ChainCheck {
  private readonly logger = new Logger(ChainCheck.name);
  private running: Promise<ChainReport> | null = null;
  private isStopping = false;
  /** The last check, as long as it has found nothing: it can go on with what came in since. */
  private whole: Reading | null = null;
  private current: ChainReport = {
    state: 'waiting',
    checkedTo: 0,
    checkedAt: null,
    tookMilliseconds: null,
    faults: [],
    faultCount: 0,
    runningTo: null,
  };

  constructor(
    private readonly log: LogReadModel,
    private readonly heads: DailyHeads,
    private readonly clock: Clock,
  ) {}

  /** What the last finished check came to, and how far one has come that runs. */
  report(): ChainReport {
    return this.current;
  }

  /** Checks everything from no. 1; whoever asks while a check runs gets that one. */
  run(): Promise<ChainReport> {
    return this.once(() => this.checkAll());
  }

  /** Checks what came in since the last check; everything where that one found something wrong. */
  follow(): Promise<ChainReport> {
    const { whole } = this;
    return this.once(() => (whole === null ? this.checkAll() : this.readOn(whole)));
  }

  /** Lets a check under way end soon, without a result. */
  async stop(): Promise<void> {
    this.isStopping = true;
    await this.running?.catch(() => undefined);
  }

  private once(check: () => Promise<ChainReport>): Promise<ChainReport> {
    this.running ??= check().finally(() => {
      this.running = null;
      this.current = { ...this.current, runningTo: null };
    });
    return this.running;
  }

  private async checkAll(): Promise<ChainReport> {
    this.current = { ...this.current, runningTo: 0 };
    const heads: LogHead[] = await this.heads.published();
    const check = new LogCheck({ sha256, heads });
    return this.readOn({ check, columns: [], next: 1, tookMilliseconds: 0 });
  }

  private async readOn(reading: Reading): Promise<ChainReport> {
    this.whole = null;
    const began = performance.now();
    const seenAt = this.clock.now();
    const lastNumber = await this.log.lastNumberGiven();
    while (!this.isStopping) {
      const entries = await this.log.entriesFrom(reading.next, sliceLength);
      for (const entry of entries) this.take(reading.check, entry, reading.columns);
      const last = entries.at(-1);
      if (last === undefined) break;
      reading.next = last.sequence + 1;
      this.current = { ...this.current, runningTo: last.sequence };
      await breathe();
    }
    if (this.isStopping) return this.current;
    reading.tookMilliseconds += Math.round(performance.now() - began);
    return this.conclude(reading, { lastNumber, seenAt });
  }

  private conclude(reading: Reading, seen: { lastNumber: number; seenAt: Instant }): ChainReport {
    const { check, columns, tookMilliseconds } = reading;
    const reached = check.newest?.sequence ?? 0;
    const verdict = check.end();
    const faults = [
      ...verdict.faults.map((fault) => ({ sequence: sequenceOf(fault), words: formatEntryFault(fault) })),
      ...columns,
      ...(reached < seen.lastNumber ? [cutTail(reached, seen.lastNumber)] : []),
    ];
    const faultCount = verdict.faultCount + faults.length - verdict.faults.length;
    if (faultCount === 0) this.whole = reading;
    this.current = {
      state: faultCount === 0 ? 'whole' : 'broken',
      checkedTo: reached,
      checkedAt: seen.seenAt,
      tookMilliseconds,
      faults: faults.slice(0, mostFaultsTold),
      faultCount,
      runningTo: null,
    };
    this.tell();
    return this.current;
  }

  private take(check: LogCheck, entry: StoredEntry, faults: ChainFault[]): void {
    const { sequence, id, receivedAt, previousHash, bodyHash, hash, body } = entry;
    check.take(formatLogLine({ sequence, id, receivedAt, previousHash, bodyHash, hash, body }));
    const wrong = wrongColumns(entry);
    if (wrong.length === 0 || faults.length >= mostFaultsTold) return;
    const words = `No. ${sequence} (${id}): the table says something else than what is sealed: ${wrong.join(', ')}.`;
    faults.push({ sequence, words });
  }

  private tell(): void {
    const { state, faults, faultCount, checkedTo } = this.current;
    if (state === 'broken')
      this.logger.error(`the sealed log is broken, ${faultCount} faults; the first: ${faults[0]?.words}`);
    else this.logger.debug(`the sealed log is whole up to no. ${checkedTo}`);
  }
}

function sequenceOf(fault: { sequence?: number } | object): number | null {
  return 'sequence' in fault && typeof fault.sequence === 'number' ? fault.sequence : null;
}

const cutTail = (reached: number, lastNumber: number): ChainFault => ({
  sequence: reached + 1,
  words: `No. ${lastNumber} was given out last, but the log ends at no. ${reached}: its tail is cut off.`,
});

/** Names of columns that disagree with the sealed body. A body that cannot be read is the chain's own fault. */
function wrongColumns(entry: StoredEntry): string[] {
  const sealed = columnsOf(parsed(entry.body));
  if (sealed === null) return ['body'];
  return (Object.keys(sealed) as (keyof typeof sealed)[]).filter((name) => sealed[name] !== entry[name]);
}

function parsed(body: string): unknown {
  try {
    return JSON.parse(body) as unknown;
  } catch {
    return null;
  }
}
