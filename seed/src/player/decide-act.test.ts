import {
  defaultStepPlanSteps,
  startOfTurn,
  turnFrom,
  type Entry,
  type PlannedTurn,
  type TurnFacts,
} from '@stubpost/shared';
import { describe, expect, it } from 'vitest';
import type { Act } from '../story/act';
import { decideAct } from './decide-act';

const at = (clock: string): number => Date.parse(`2026-03-03T${clock}Z`);

const planned: PlannedTurn = {
  id: 'turn-1',
  kind: 'turn',
  serviceDate: '2026-03-03',
  reverses: true,
  inboundTrain: '1731',
  outboundTrain: '1742',
  scheduledArrivalAt: at('22:18:00'),
  scheduledDepartureAt: at('22:40:00'),
  track: '3',
  set: 'W03',
};

const act = (content: Act['content'], clock: string): Act => ({
  observedAt: at(clock),
  toldAt: at(clock) + 3000,
  teller: 'feed',
  source: 'by-feed',
  content,
});

let running = 0;
function entry(content: Record<string, unknown>, clock: string): Entry {
  running += 1;
  return {
    id: `00000000-0000-4000-8000-${String(running).padStart(12, '0')}`,
    subject: { kind: 'turn', id: planned.id },
    observedAt: at(clock),
    receivedAt: at(clock),
    source: 'by-hand',
    by: { personId: 'somebody', name: 'Somebody' },
    ...content,
  } as Entry;
}

const facts = (...entries: Entry[]): TurnFacts => turnFrom(planned, defaultStepPlanSteps, entries);
const visited = (): Entry =>
  entry({ kind: 'crew', person: { personId: 'visitor', name: 'V. Isitor' }, as: 'conductor' }, '22:10:00');
const scene = (it: Act, known: TurnFacts, clock: string) => ({
  act: it,
  facts: known,
  storyConductorId: 'story',
  now: at(clock),
});
const leaves = act({ kind: 'departure' }, '22:40:10');
const handbrake = act({ kind: 'step-done', step: 'handbrake-set' }, '22:20:00');

describe('what becomes of an act whose time has come', () => {
  it('is told when nobody else has acted', () => {
    const known = startOfTurn(planned, defaultStepPlanSteps);
    expect(decideAct(scene(handbrake, known, '22:20:03'))).toEqual({ kind: 'tell', act: handbrake });
  });

  it('is left out when somebody has recorded the step already', () => {
    const known = facts(entry({ kind: 'step-done', step: 'handbrake-set' }, '22:19:30'));
    expect(decideAct(scene(handbrake, known, '22:20:03'))).toEqual({ kind: 'leave-out' });
  });

  it('is left to a visitor who has the turn', () => {
    expect(decideAct(scene(handbrake, facts(visited()), '22:20:03'))).toEqual({ kind: 'leave-out' });
  });

  it('does not happen on an annulled turn', () => {
    const known = facts(entry({ kind: 'annulled', reason: 'no crew' }, '22:00:00'));
    expect(decideAct(scene(leaves, known, '22:41:00'))).toEqual({ kind: 'leave-out' });
  });

  it('waits with the departure while a hold stands, and then leaves after it', () => {
    const known = facts(
      entry({ kind: 'hold', until: at('22:45:00'), reason: 'late connection' }, '22:30:00'),
    );
    expect(decideAct(scene(leaves, known, '22:41:00'))).toEqual({ kind: 'wait' });
    expect(decideAct(scene(leaves, known, '22:45:10'))).toEqual({
      kind: 'tell',
      act: { ...leaves, observedAt: at('22:45:06') },
    });
  });

  it('waits for a visitor who has not finished, but not for ever', () => {
    expect(decideAct(scene(leaves, facts(visited()), '22:42:00'))).toEqual({ kind: 'wait' });
    expect(decideAct(scene(leaves, facts(visited()), '23:41:00'))).toEqual({ kind: 'leave-out' });
  });

  it('leaves after the last step of a visitor who was late', () => {
    const holding = defaultStepPlanSteps.filter((step) => step.holdsDeparture);
    const entries = holding.map((step, index) =>
      entry({ kind: 'step-done', step: step.key }, `22:4${index}:30`),
    );
    const known = facts(visited(), ...entries);
    expect(decideAct(scene(leaves, known, '22:46:50'))).toEqual({
      kind: 'tell',
      act: { ...leaves, observedAt: at('22:46:36') },
    });
  });
});
