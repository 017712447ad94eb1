import type { WireStepPlan } from '@stubpost/shared';
import { useQuery } from '@tanstack/react-query';
import { useOutbox } from '../../../lib/outbox/use-outbox';
import { planQuery, settingsQuery } from '../api/turn-queries';
import { useTurnScene } from './turn-context';

/** The version of the step plan that the turn runs by; undefined while it is on its way. */
export function useTurnPlan(): WireStepPlan | undefined {
  return useQuery(planQuery(useTurnScene().turn.planId)).data;
}

/** Whether the terminal asks this person for the safety briefing before anything is recorded from the controlling cab. */
export function useAsksBriefing(): boolean {
  const { turn, me } = useTurnScene();
  const { waiting } = useOutbox().state;
  const isRequired = useQuery(settingsQuery(turn.terminal)).data?.briefingRequired ?? false;
  const isBriefed =
    turn.briefedBy?.includes(me.id) === true ||
    waiting.some((entry) => entry.turn === turn.id && entry.kind === 'briefing' && entry.refusal === null);
  return isRequired && !isBriefed;
}
