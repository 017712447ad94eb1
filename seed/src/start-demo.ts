import { setTimeout as pause } from 'node:timers/promises';
import { Logger } from '@nestjs/common';
import { Clock, DemoService, type StartDemo, TurnSweep } from '@stubpost/service';
import { addDays, calendarDateAt, datesBetween } from '@stubpost/shared';
import { gatherCast } from './player/cast';
import { DayPlayer } from './player/day-player';
import { DeskPlayer } from './player/desk-player';
import { HistoryFiller } from './player/history-filler';
import { keepRoster } from './player/keep-roster';
import { ensureTerminals, openDemoDay, prepareRailroad } from './player/prepare-railroad';
import { demoZone } from './railroad/geography';

/** First the two weeks that visitors look at, then as many as a planner wants. */
const firstDays = 14;
const allDays = 56;
const tickMilliseconds = 2000;

const logger = new Logger('demo');

/** Waits without holding a stopping service up. */
async function rest(milliseconds: number, signal: AbortSignal): Promise<void> {
  await pause(milliseconds, undefined, { signal }).catch(() => undefined);
}

async function playDays(player: DayPlayer, desk: DeskPlayer, signal: AbortSignal): Promise<void> {
  while (!signal.aborted) {
    try {
      await player.tick();
      await desk.tick();
    } catch (error) {
      if (!signal.aborted) logger.error(`the crews stopped for a moment: ${String(error)}`);
    }
    await rest(tickMilliseconds, signal);
  }
}

/**
 * Makes the invented railroad, brings today up to now, then lets crews act as time passes while the past weeks are
 * written behind. After a restart it goes on where it was.
 */
export const startDemo: StartDemo = async (app, signal) => {
  const demo = app.get(DemoService);
  demo.report({ state: 'filling', message: 'The railroad is being made' });
  await ensureTerminals(app);
  const cast = await gatherCast(app);
  const today = calendarDateAt(app.get(Clock).now(), demoZone);
  const player = new DayPlayer(app, cast);
  const desk = new DeskPlayer(app, cast);
  await app.get(TurnSweep).holdWhile(async () => {
    await prepareRailroad(app, cast, { today, firstDay: addDays(today, -allDays) });
    await keepRoster(app, cast);
    demo.report({ state: 'filling', message: 'Today is being brought up to now' });
    await player.tick();
  });
  const playing = playDays(player, desk, signal);
  const filler = new HistoryFiller(app, cast, desk, (date) => openDemoDay(app, date));
  const past = datesBetween(addDays(today, -allDays), addDays(today, -2)).reverse();
  for (const [index, date] of past.entries()) {
    if (signal.aborted) break;
    if (index < firstDays)
      demo.report({ state: 'filling', message: `History: ${index} of ${firstDays} days are written` });
    else if (index === firstDays) demo.report({ state: 'ready', message: '' });
    await filler.fill(date, signal);
  }
  demo.report({ state: 'ready', message: '' });
  await playing;
};
