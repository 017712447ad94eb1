import type { PlanStep } from '@stubpost/shared';
import type { TurnNow } from '../../../lib/turn/turn-now';
import type { EntryBody } from './entry-draft';

const counted = (count: number, one: string): string => `${count} ${count === 1 ? one : `${one}s`}`;

/**
 * The fact that must be confirmed a second time, in another place, before it is recorded: handbrakes off, a turn
 * annulled, a blue signal taken down. Null for everything else.
 */
export function secondBarWords(body: EntryBody, turn: TurnNow, steps: readonly PlanStep[]): string | null {
  const where = `train ${turn.train}${turn.track === null ? '' : `, track ${turn.track}`}`;
  switch (body.kind) {
    case 'annulled':
      return `Annul ${where}: ${body.reason}`;
    case 'blue-signal-down':
      return `Take down the blue signal on ${where}`;
    case 'step-done': {
      const plan = steps.find((step) => step.key === body.step);
      if (plan?.kind !== 'securement' || plan.anchor !== 'departure') return null;
      const count = body.reading?.count;
      const cars = body.reading?.cars ?? [];
      const brakes = count === undefined ? 'the handbrakes' : counted(count, 'handbrake');
      const named = cars.length === 0 ? '' : `, ${cars.length === 1 ? 'car' : 'cars'} ${listed(cars)}`;
      return `Release ${brakes}${named}, ${where}`;
    }
    default:
      return null;
  }
}

function listed(cars: readonly string[]): string {
  return cars.length === 1 ? (cars[0] ?? '') : `${cars.slice(0, -1).join(', ')} and ${cars.at(-1)}`;
}

/** What must be true about the air before a handbrake is released, as recorded; shown beside the second bar. */
export function airWords(turn: TurnNow, steps: readonly PlanStep[]): string {
  const manned = steps.find((step) => step.kind === 'movement' && step.anchor === 'departure');
  const done = turn.steps.find((step) => step.key === manned?.key);
  if (done?.doneAt === null || done === undefined) return 'No engineer is recorded in the leaving cab.';
  const pressure = done.reading?.brakePipePsi;
  return pressure === undefined
    ? 'Engineer recorded in the leaving cab, no brake-pipe pressure recorded.'
    : `Engineer recorded in the leaving cab, brake pipe ${pressure} psi.`;
}
