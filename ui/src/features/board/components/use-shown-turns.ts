import type { Instant, WireTerminal } from '@stubpost/shared';
import { useMemo } from 'react';
import type { BoardView } from '../model/board-search';
import type { TurnNow } from '../../../lib/turn/turn-now';
import { filterTurns } from '../model/filter-turns';
import { dayBounds, serviceDateAt, serviceDatesOf } from '../model/service-dates';
import { overlaps, windowAt, type TimeWindow } from '../model/time-window';
import { bySchedule, shownStretch } from '../../../lib/turn/turn-times';
import { useBoardTurns, type BoardTurns } from './use-board-turns';
import { useSteadyIds, type Steady } from './use-steady-ids';

/** What the board shows at one moment. */
export interface ShownTurns extends Pick<BoardTurns, 'isPending' | 'error' | 'retry'> {
  window: TimeWindow;
  /** The service date that the words of the page name. */
  date: string;
  /** In the window and matching the filter, in order of departure, held in place under pointer and focus. */
  shown: readonly TurnNow[];
  all: ReadonlyMap<string, TurnNow>;
  /** Turns of the service date, without window and filter. */
  total: number;
  /** Turns in the window, without the filter. */
  inWindow: number;
  steady: Steady;
}

export interface ShownQuestion {
  terminal: WireTerminal;
  view: BoardView;
  now: Instant;
  holdKey: string | undefined;
}

/** Turns of the service dates in sight, cut to the window and the filter. */
export function useShownTurns({ terminal, view, now, holdKey }: ShownQuestion): ShownTurns {
  const { zone } = terminal;
  const date = serviceDateAt(view.startAt ?? now, zone);
  const rough = windowAt(view, now, { from: view.startAt ?? now, to: (view.startAt ?? now) + 1 });
  const dates = view.span === 'day' ? [date] : serviceDatesOf(rough, zone);
  const { turns, isPending, error, retry } = useBoardTurns({
    terminal,
    dates: dates.includes(date) ? dates : [...dates, date].sort(),
    now,
    holdKey,
  });
  const window = windowAt(view, now, dayBounds(turns, date, zone));
  const all = useMemo(() => new Map(turns.map((turn) => [turn.id, turn])), [turns]);
  const inWindow = turns.filter((turn) => overlaps(shownStretch(turn, now), window));
  const wanted = filterTurns(inWindow, view.filter).sort(bySchedule);
  const key = JSON.stringify([terminal.code, view.span, view.startAt, view.filter]);
  const steady = useSteadyIds(
    wanted.map((turn) => turn.id),
    key,
  );
  const shown = steady.ids.flatMap((id) => all.get(id) ?? []);
  return {
    window,
    date,
    shown,
    all,
    total: turns.filter((turn) => turn.serviceDate === date).length,
    inWindow: inWindow.length,
    steady,
    isPending,
    error,
    retry,
  };
}
