import { setTimeout as pause } from 'node:timers/promises';
import type { INestApplicationContext } from '@nestjs/common';
import { INSTALLATION, Reader, Settings, TurnsService, UnitOfWork } from '@stubpost/service';
import { addDays, serviceInstant, type CalendarDate } from '@stubpost/shared';
import { demoZone } from '../railroad/geography';
import type { TurnStory } from '../story/act';
import { actRequest } from './act-entry';
import type { Cast } from './cast';
import { storiesOfDay } from './day-book';
import type { DeskPlayer } from './desk-player';
import { personIdIn, writerOf } from './teller';

/** Name of the setting that lists the service dates which are filled. */
const filledDays = 'demo-filled-days';
/** Breath for everybody else between two turns of the past. */
const breathMilliseconds = 2;
/** When the supervisor goes through yesterday: 09:30. */
const morningSeconds = 9.5 * 3600;

/** Opens one service date of the running timetable. */
export type OpenDay = (serviceDate: CalendarDate) => Promise<void>;

/** Writes past days into the record, one turn after another, through the same service as everything else. */
export class HistoryFiller {
  constructor(
    private readonly app: INestApplicationContext,
    private readonly cast: Cast,
    private readonly desk: DeskPlayer,
    private readonly openDay: OpenDay,
  ) {}

  /** Fills a day unless it is filled already. Broken off, it goes on at the next start where it was. */
  async fill(serviceDate: CalendarDate, signal: AbortSignal): Promise<void> {
    const days = await this.filled();
    if (days.includes(serviceDate)) return;
    await this.openDay(serviceDate);
    for (const stories of await storiesOfDay(this.app, this.cast, serviceDate)) {
      for (const story of stories) {
        if (signal.aborted) return;
        await this.tell(story);
        await pause(breathMilliseconds);
      }
    }
    await this.desk.settle(serviceDate, serviceInstant(addDays(serviceDate, 1), morningSeconds, demoZone));
    const settings = this.app.get(Settings);
    await this.app.get(UnitOfWork).run((transaction) =>
      settings.put(transaction, {
        scope: INSTALLATION,
        name: filledDays,
        value: [...days, serviceDate],
        changedBy: null,
      }),
    );
  }

  private async filled(): Promise<CalendarDate[]> {
    return (await this.app.get(Settings).find<CalendarDate[]>(INSTALLATION, filledDays))?.value ?? [];
  }

  private async tell(story: TurnStory): Promise<void> {
    const [known] = await this.app
      .get(Reader)
      .query<{ entry_count: number }>('SELECT entry_count FROM turn WHERE id = ?', [story.turnId]);
    if (known === undefined || known.entry_count > 0) return;
    await this.app.get(TurnsService).recordPastEntries(
      story.acts.map((act) => ({
        turnId: story.turnId,
        request: actRequest(story.turnId, act, personIdIn(this.cast)),
        actor: writerOf(this.cast, story, act),
        now: Math.max(act.toldAt, act.observedAt),
      })),
    );
  }
}
