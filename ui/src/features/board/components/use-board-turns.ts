import {
  type Instant,
  type WireBoard,
  type WireStepPlan,
  type WireTerminal,
  type WireTurn,
} from '@stubpost/shared';
import { useQueries } from '@tanstack/react-query';
import { useMemo, useRef } from 'react';
import { planQuery } from '../../../lib/turn/turn-queries';
import { useLatenessSettings } from '../../../lib/turn/use-turn-at';
import { boardQuery } from '../api/board-queries';
import type { TurnNow } from '../../../lib/turn/turn-now';
import { turnAt } from '../../../lib/turn/turn-at';

/** The turns of a terminal for some service dates, as they stand at one moment. */
export interface BoardTurns {
  turns: readonly TurnNow[];
  isPending: boolean;
  error: Error | null;
  retry: () => void;
  /** When the service last answered for the oldest of the lists; null before the first answer. */
  answeredAt: Instant | null;
}

export interface BoardTurnsQuestion {
  terminal: WireTerminal;
  dates: readonly string[];
  now: Instant;
  /** While this stays the same the picture stands still; undefined lets every change through. */
  holdKey: string | undefined;
}

/** Asks for the lists and the plans they need, and works every turn out at `now`. */
export function useBoardTurns({ terminal, dates, now, holdKey }: BoardTurnsQuestion): BoardTurns {
  const boards = useQueries({
    queries: dates.map((date) => boardQuery(terminal.code, date)),
    combine: combineBoards,
  });
  const wires = useHeld(boards.turns, holdKey);
  const plans = usePlans(wires);
  const settings = useLatenessSettings(terminal.code, terminal.zone);
  const turns = useMemo(
    () => wires.map((wire) => turnAt(wire, { plan: plans.get(wire.planId), settings }, now)),
    [wires, plans, settings, now],
  );
  return {
    turns,
    isPending: boards.isPending,
    error: boards.error,
    retry: boards.retry,
    answeredAt: boards.answeredAt,
  };
}

type BoardResult = {
  data: WireBoard | undefined;
  isPending: boolean;
  error: Error | null;
  dataUpdatedAt: number;
  refetch: () => unknown;
};

function combineBoards(results: BoardResult[]) {
  const seen = new Set<string>();
  const turns = results
    .flatMap((result) => result.data?.turns ?? [])
    .filter((turn) => !seen.has(turn.id) && seen.add(turn.id));
  return {
    turns,
    isPending: results.some((result) => result.isPending),
    error: results.find((result) => result.data === undefined && result.error !== null)?.error ?? null,
    answeredAt: results.every((result) => result.dataUpdatedAt > 0)
      ? Math.min(...results.map((result) => result.dataUpdatedAt))
      : null,
    retry: () => results.forEach((result) => void result.refetch()),
  };
}

/** The newest value, or the one that stood when `holdKey` came. */
export function useHeld<Value>(value: Value, holdKey: string | undefined): Value {
  const held = useRef({ value, holdKey });
  if (holdKey === undefined || held.current.holdKey !== holdKey) held.current = { value, holdKey };
  return held.current.value;
}

function usePlans(wires: readonly WireTurn[]): ReadonlyMap<string, WireStepPlan> {
  const ids = useMemo(() => [...new Set(wires.map((turn) => turn.planId))].sort(), [wires]);
  return useQueries({ queries: ids.map((id) => planQuery(id)), combine: combinePlans });
}

function combinePlans(results: { data: WireStepPlan | undefined }[]): ReadonlyMap<string, WireStepPlan> {
  return new Map(results.flatMap(({ data }) => (data === undefined ? [] : [[data.id, data] as const])));
}
