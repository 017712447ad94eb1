import { latenessSettingsOf, shippedThresholds } from '@stubpost/shared';
import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useEffect, useMemo } from 'react';
import { rememberTerminal, terminalsQuery } from '../../../lib/terminal-choice';
import { usePerson } from '../../../lib/session';
import { toServerTime, useNow } from '../../../lib/use-now';
import {
  entriesQuery,
  myBoardQuery,
  planQuery,
  settingsQuery,
  turnOnBoards,
  turnQuery,
} from '../api/turn-queries';
import { useOutbox } from '../../../lib/outbox/use-outbox';
import { useRecorder } from '../api/use-recorder';
import { nextArrivalAsEngineer } from '../model/controls';
import { knownTurn } from '../model/known-turn';
import { crewRolesAt, roleOnTurn } from '../model/my-turns';
import { turnAt } from '../model/turn-now';
import { markerWords } from './train-facts';
import type { TurnScene } from './turn-context';

/** The scene of a turn, or why it is not there yet. */
export type SceneState =
  | { kind: 'loading'; retry: () => void }
  | { kind: 'failed'; error: Error; retry: () => void }
  | { kind: 'here'; scene: TurnScene };

const noEntries: TurnScene['entries'] = [];

/** Everything the page of a turn needs, put together anew each second. */
export function useTurnSceneOf(turnId: string): SceneState {
  const person = usePerson();
  const now = useNow();
  const queue = useOutbox();
  const record = useRecorder(queue, turnId);
  const client = useQueryClient();
  const turnResult = useQuery({ ...turnQuery(turnId), ...turnOnBoards(client, turnId) });
  const told = turnResult.data;
  const planResult = useQuery({ ...planQuery(told?.planId ?? ''), enabled: told !== undefined });
  const entries = useQuery(entriesQuery(turnId)).data;
  const terminals = useQuery(terminalsQuery).data;
  const mine = useQuery({ ...myBoardQuery(told?.terminal ?? ''), enabled: told !== undefined }).data;
  const thresholds = useQuery({ ...settingsQuery(told?.terminal ?? ''), enabled: told !== undefined }).data
    ?.thresholds;
  const { waiting } = queue.state;
  const plan = planResult.data;

  const terminal = told?.terminal;
  useEffect(() => {
    // The stream of this tab follows the terminal of the turn that is open.
    if (terminal !== undefined) rememberTerminal(terminal);
  }, [terminal]);

  const known = useMemo(() => {
    if (told === undefined || plan === undefined) return null;
    const own = waiting.filter((entry) => entry.turn === turnId && entry.refusal === null);
    return knownTurn({
      turn: told,
      plan,
      entries,
      waiting: own.map((entry) => entry.payload),
      writer: person,
    });
  }, [told, plan, entries, waiting, turnId, person]);

  const retry = (): void => {
    void turnResult.refetch();
    void planResult.refetch();
  };
  const error = turnResult.error ?? planResult.error;
  if (known === null) return error === null ? { kind: 'loading', retry } : { kind: 'failed', error, retry };

  const rules = latenessSettingsOf(thresholds ?? shippedThresholds, known.turn.zone);
  const turn = turnAt(known.turn, known.planSteps, rules, now);
  const me = {
    id: person.id,
    name: person.name,
    role: roleOnTurn(turn, person.id),
    roles: crewRolesAt(person, turn.terminal),
  };
  const { steps, handbrakes, releases } = known;
  const marker = markerWords(turn, terminals ?? []);
  const nextArrivalAt = nextArrivalAsEngineer(mine?.turns ?? [], person.id, turn);
  return {
    kind: 'here',
    scene: {
      turn,
      steps,
      handbrakes,
      releases,
      entries: entries ?? noEntries,
      now,
      me,
      marker,
      nextArrivalAt,
      toldAt: toServerTime(turnResult.dataUpdatedAt),
      record,
    },
  };
}
