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

/** Entries checked in one go: a few milliseconds, then everybody else has their turn. */
const sliceLength = 100;
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

/**
 * Checks the log in the database from no. 1, with the very check that the stand-alone checker does, and the columns
 * that repeat what the bodies say, the published heads, and that no number is given out without an entry. Works in
 * small slices between requests.
 */
@Injectable()
export class ChainCheck {
  private readonly logger = new Logger(ChainCheck.name);
  private running: Promise<ChainReport> | null = null;
  private isStopping = false;
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

  /** Checks everything; whoever asks while a check runs gets that one. */
  run(): Promise<ChainReport> {
    this.running ??= this.check().finally(() => {
      this.running = null;
      this.current = { ...this.current, runningTo: null };
    });
    return this.running;
  }

  /** Lets a check under way end soon, without a result. */
  async stop(): Promise<void> {
    this.isStopping = true;
    await this.running?.catch(() => undefined);
  }

  private async check(): Promise<ChainReport> {
    this.current = { ...this.current, runningTo: 0 };
    const beganAt = this.clock.now();
    const began = performance.now();
    const heads: LogHead[] = await this.heads.published();
    const lastNumber = await this.log.lastNumberGiven();
    const check = new LogCheck({ sha256, heads });
    const columns: ChainFault[] = [];
    for (let next = 1; !this.isStopping;) {
      const entries = await this.log.entriesFrom(next, sliceLength);
      for (const entry of entries) this.take(check, entry, columns);
      const last = entries.at(-1);
      if (last === undefined) break;
      next = last.sequence + 1;
      this.current = { ...this.current, runningTo: last.sequence };
      await breathe();
    }
    if (this.isStopping) return this.current;
    const reached = check.newest?.sequence ?? 0;
    const verdict = check.end();
    const faults = [
      ...verdict.faults.map((fault) => ({ sequence: sequenceOf(fault), words: formatEntryFault(fault) })),
      ...columns,
      ...(reached < lastNumber ? [cutTail(reached, lastNumber)] : []),
    ];
    const faultCount = verdict.faultCount + faults.length - verdict.faults.length;
    this.current = {
      state: faultCount === 0 ? 'whole' : 'broken',
      checkedTo: reached,
      checkedAt: beganAt,
      tookMilliseconds: Math.round(performance.now() - began),
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
