import { setImmediate as letOthersRun } from 'node:timers/promises';
import { Injectable } from '@nestjs/common';
import type { AlertCause, AlertMemory, Instant } from '@stubpost/shared';
import { AlertEscalation } from '../alerts/alert-escalation';
import { AlertKeeper } from '../alerts/alert-keeper';
import { LatenessRules } from '../alerts/lateness-rules';
import { isNews, lookAt } from '../alerts/turn-look';
import { WatchRepository } from '../alerts/watch.repository';
import { type Transaction, UnitOfWork } from '../database/unit-of-work';
import { SweepableTurns } from './sweepable-turns.read-model';
import { TurnChanges } from './turn-changes';
import type { TurnFile } from './turn-file';
import { TurnFiles, type TurnVersion } from './turn-files';
import { TurnRepository } from './turn.repository';
import { isOver, watchedTurnOf } from './watched-turn';

/** So many turns are looked at before others get their turn on the event loop. */
const looksAtOnce = 50;
/** So many turns are written in one transaction, so that entries need not wait long. */
const writesAtOnce = 20;

/** What a sweep did. */
export interface SweepCounts {
  /** Turns that were looked at. */
  looked: number;
  /** Turns on which something was raised, updated, cleared, remembered or settled. */
  written: number;
}

type Memories = Map<string, Map<AlertCause, AlertMemory>>;

/**
 * Looks at every open turn: raises and clears what is due, and lets go of turns on which nothing can change any more.
 * All of it follows from what is in the tables at the moment it runs, so a run that was missed, doubled or cut off
 * makes no difference. Two runs never overlap.
 */
@Injectable()
export class TurnSweep {
  private running: Promise<SweepCounts> | undefined;
  private holds = 0;

  constructor(
    private readonly sweepable: SweepableTurns,
    private readonly files: TurnFiles,
    private readonly turns: TurnRepository,
    private readonly changes: TurnChanges,
    private readonly keeper: AlertKeeper,
    private readonly escalation: AlertEscalation,
    private readonly rules: LatenessRules,
    private readonly watches: WatchRepository,
    private readonly unitOfWork: UnitOfWork,
  ) {}

  /** One run as of a moment. While one is running, a second call waits for that one and runs none of its own. */
  sweep(now: Instant): Promise<SweepCounts> {
    if (this.holds > 0) return Promise.resolve({ looked: 0, written: 0 });
    this.running ??= this.run(now).finally(() => {
      this.running = undefined;
    });
    return this.running;
  }

  /**
   * Does something during which nothing is swept, such as writing down a past that nobody can act on any more; what
   * is still so afterwards is found by the next run.
   */
  async holdWhile<Outcome>(work: () => Promise<Outcome>): Promise<Outcome> {
    this.holds += 1;
    try {
      await this.running?.catch(() => undefined);
      return await work();
    } finally {
      this.holds -= 1;
    }
  }

  private async run(now: Instant): Promise<SweepCounts> {
    const open = await this.sweepable.findOpen(now);
    const memories = await this.watches.findAll();
    const failures: unknown[] = [];
    const due: string[] = [];
    await inChunks(open, looksAtOnce, failures, async (turns) => {
      due.push(...(await this.look(turns, memories, now)));
      await letOthersRun();
    });
    await inChunks(due, writesAtOnce, failures, (ids) => this.write(ids, now));
    const left = await this.sweepable.findLeftBehind();
    await inChunks(left, writesAtOnce, failures, (ids) => this.release(ids, now));
    await this.escalation.follow(now).catch((error: unknown) => failures.push(error));
    if (failures.length > 0)
      throw new AggregateError(failures, `${failures.length} turns could not be looked at`);
    return { looked: open.length, written: due.length + left.length };
  }

  /** Ids of the turns among some on which there is something to write. */
  private async look(turns: readonly TurnVersion[], memories: Memories, now: Instant): Promise<string[]> {
    const files = await this.files.findAll(turns);
    const due: string[] = [];
    for (const file of files.values()) {
      const { id } = file.record;
      if (await this.isDue(file, memories.get(id) ?? new Map<AlertCause, AlertMemory>(), now)) due.push(id);
    }
    return due;
  }

  private async isDue(
    file: TurnFile,
    memories: Map<AlertCause, AlertMemory>,
    now: Instant,
  ): Promise<boolean> {
    const { terminalCode, zone } = file.record;
    const rules = await this.rules.of(terminalCode, zone);
    if (lookAt(watchedTurnOf(file), rules, memories, now).some(isNews)) return true;
    const isBack = file.alerts.some((alert) => alert.setAsideUntil !== null && now >= alert.setAsideUntil);
    return isBack || (isOver(file.facts, now) && file.alerts.length === 0 && memories.size === 0);
  }

  /** Looks again inside the transaction, for an entry may have come in meanwhile, and writes what is then to be written. */
  private write(ids: readonly string[], now: Instant): Promise<void> {
    return this.unitOfWork.run(async (transaction) => {
      for (const id of ids) await this.bring(transaction, id, now);
      await this.changes.write(transaction);
    });
  }

  private async bring(transaction: Transaction, id: string, now: Instant): Promise<void> {
    const before = await this.turns.findById(transaction, id);
    if (before === null || before.withdrawnAt !== null) return;
    const file = await this.files.open(transaction, before);
    const { alerts, isChanged, isQuiet } = await this.keeper.observe(transaction, watchedTurnOf(file), now);
    const settledAt = isQuiet && isOver(file.facts, now) ? now : null;
    if (!isChanged && (settledAt === null) === (before.settledAt === null)) return;
    const record = await this.turns.follow(transaction, { ...file.record, settledAt });
    this.files.stage(transaction, { ...file, record, alerts });
    this.changes.note(transaction, record);
  }

  private release(ids: readonly string[], now: Instant): Promise<void> {
    return this.unitOfWork.run(async (transaction) => {
      for (const id of ids) {
        const record = await this.turns.findById(transaction, id);
        if (record === null) continue;
        const { alerts } = await this.files.open(transaction, record);
        await this.keeper.release(transaction, { turnId: id, alerts }, now);
        await this.turns.touch(transaction, id);
      }
    });
  }
}

/**
 * Works through items in chunks. When a chunk fails its items are tried one by one, so that one that cannot be worked
 * on does not keep the others from it; what failed is gathered, and the run as a whole then counts as failed.
 */
async function inChunks<Item>(
  items: readonly Item[],
  size: number,
  failures: unknown[],
  work: (chunk: readonly Item[]) => Promise<void>,
): Promise<void> {
  for (let start = 0; start < items.length; start += size) {
    const chunk = items.slice(start, start + size);
    try {
      await work(chunk);
    } catch (error) {
      if (chunk.length === 1) failures.push(error);
      else await inChunks(chunk, 1, failures, work);
    }
  }
}
