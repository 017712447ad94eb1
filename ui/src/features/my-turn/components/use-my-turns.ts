import {
  latenessSettingsOf,
  recordableKinds,
  shippedThresholds,
  type Instant,
  type WireTerminal,
  type WireTurn,
} from '@stubpost/shared';
import { useQueries, useQuery } from '@tanstack/react-query';
import { terminalsQuery } from '../../../lib/terminal-choice';
import { usePerson } from '../../../lib/session';
import { toServerTime, useNow } from '../../../lib/use-now';
import { myBoardQuery, planQuery } from '../api/turn-queries';
import { useOutbox } from '../../../lib/outbox/use-outbox';
import { knownTurn } from '../model/known-turn';
import { sortMyTurns, type MyTurns } from '../model/my-turns';
import { turnAt } from '../model/turn-now';

/** The turns at the terminals where the person is crew. */
export interface MyTurnsState {
  terminals: WireTerminal[];
  turns: MyTurns;
  isLoading: boolean;
  /** When the oldest of the boards was told; null before the first answer. */
  toldAt: Instant | null;
  error: Error | null;
  retry: () => void;
}

/** Terminals at which the person records something about turns: as crew, or beside it. */
export function crewTerminals(
  terminals: readonly WireTerminal[],
  person: ReturnType<typeof usePerson>,
): WireTerminal[] {
  return terminals.filter(({ code }) => recordableKinds(person, code).length > 0);
}

/** The boards of all my terminals, each turn as this phone knows it, at this second. */
export function useMyTurns(): MyTurnsState {
  const person = usePerson();
  const now = useNow();
  const { state } = useOutbox();
  const terminalsResult = useQuery(terminalsQuery);
  const terminals = crewTerminals(terminalsResult.data ?? [], person);
  const boards = useQueries({ queries: terminals.map(({ code }) => myBoardQuery(code)) });
  const told = boards.flatMap((board) => board.data?.turns ?? []);
  const planIds = [...new Set(told.map((turn) => turn.planId))];
  const plans = useQueries({ queries: planIds.map((id) => planQuery(id)) }).flatMap(
    (plan) => plan.data ?? [],
  );

  const atThisSecond = (turn: WireTurn): WireTurn => {
    const plan = plans.find(({ id }) => id === turn.planId);
    if (plan === undefined) return turn;
    const waiting = state.waiting.filter((entry) => entry.turn === turn.id && entry.refusal === null);
    const known = knownTurn({
      turn,
      plan,
      entries: undefined,
      waiting: waiting.map((entry) => entry.payload),
      writer: person,
    });
    return turnAt(known.turn, known.planSteps, latenessSettingsOf(shippedThresholds, turn.zone), now);
  };

  return {
    terminals,
    turns: sortMyTurns(told.map(atThisSecond), person.id, now),
    toldAt: oldest(boards.map((board) => board.dataUpdatedAt)),
    isLoading: terminalsResult.isPending || boards.some((board) => board.isPending),
    error: terminalsResult.error ?? boards.find((board) => board.error !== null)?.error ?? null,
    retry: () => {
      void terminalsResult.refetch();
      boards.forEach((board) => void board.refetch());
    },
  };
}

function oldest(updates: readonly number[]): Instant | null {
  const told = updates.filter((at) => at > 0);
  return told.length === 0 ? null : toServerTime(Math.min(...told));
}
