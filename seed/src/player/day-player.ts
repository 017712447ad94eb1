import { setImmediate as nextTurn } from 'node:timers/promises';
import type { INestApplicationContext } from '@nestjs/common';
import { Clock, Reader, TurnFiles, TurnsService } from '@stubpost/service';
import { calendarDateAt, addDays, secondsBetween, type CalendarDate, type Instant } from '@stubpost/shared';
import { demoZone } from '../railroad/geography';
import type { Act, TurnStory } from '../story/act';
import { actEntryId, actRequest } from './act-entry';
import type { Cast } from './cast';
import { storiesOfDay } from './day-book';
import { decideAct } from './decide-act';
import { personIdIn, writerOf } from './teller';

/** An act that was to be told longer ago than this is told with its own time of telling: the player was away. */
const awaySeconds = 60;

interface PendingAct {
  story: TurnStory;
  act: Act;
}

/** Lets the crews of the demo act as time passes: tells each act of today's stories once its time has come. */
export class DayPlayer {
  private readonly pending = new Map<CalendarDate, PendingAct[]>();

  constructor(
    private readonly app: INestApplicationContext,
    private readonly cast: Cast,
  ) {}

  /** Tells everything that is due. Days are taken up by themselves; yesterday's last trains run past midnight. */
  async tick(): Promise<void> {
    const now = this.app.get(Clock).now();
    const today = calendarDateAt(now, demoZone);
    for (const date of [today, addDays(today, -1), addDays(today, 1)]) {
      const acts = await this.actsOf(date);
      const due = acts.filter(({ act }) => act.toldAt <= now);
      if (due.length > 0) this.pending.set(date, await this.tellAll(acts, due, now));
    }
    for (const date of this.pending.keys()) if (date < addDays(today, -1)) this.pending.delete(date);
  }

  /** Acts that are still to be told, in the order of their telling. A day without turns is looked at again next time. */
  private async actsOf(date: CalendarDate): Promise<PendingAct[]> {
    const known = this.pending.get(date);
    if (known !== undefined) return known;
    const stories = (await storiesOfDay(this.app, this.cast, date)).flat();
    if (stories.length === 0) return [];
    const told = await this.app
      .get(Reader)
      .query<{ id: string }>('SELECT id FROM entry WHERE service_date = ?', [date]);
    const toldIds = new Set(told.map((row) => row.id));
    const acts = stories
      .flatMap((story) => story.acts.map((act) => ({ story, act })))
      .filter(({ story, act }) => !toldIds.has(actEntryId(story.turnId, act)))
      .sort((a, b) => a.act.toldAt - b.act.toldAt);
    this.pending.set(date, acts);
    return acts;
  }

  private async tellAll(acts: PendingAct[], due: PendingAct[], now: Instant): Promise<PendingAct[]> {
    const finished = new Set<PendingAct>();
    for (const pending of due) {
      if (await this.tell(pending, now)) finished.add(pending);
      // A whole day to catch up on must not keep requests waiting.
      await nextTurn();
    }
    return acts.filter((pending) => !finished.has(pending));
  }

  /** Whether the act is over with: told, or left out for good. */
  private async tell({ story, act }: PendingAct, now: Instant): Promise<boolean> {
    const file = await this.app.get(TurnFiles).find(story.turnId);
    if (file === null) return true;
    const storyConductorId = personIdIn(this.cast)(story.crew.conductor);
    const decision = decideAct({ act, facts: file.facts, storyConductorId, now });
    if (decision.kind !== 'tell') return decision.kind === 'leave-out';
    const isCatchingUp = secondsBetween(act.toldAt, now) > awaySeconds;
    await this.app.get(TurnsService).recordEntry({
      turnId: story.turnId,
      request: actRequest(story.turnId, decision.act, personIdIn(this.cast)),
      actor: writerOf(this.cast, story, act),
      now: isCatchingUp ? Math.max(act.toldAt, decision.act.observedAt) : now,
    });
    return true;
  }
}
