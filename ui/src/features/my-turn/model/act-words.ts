import type { CrewRole, PlanStep, WireReading } from '@stubpost/shared';
import { carList, handbrakeWords, readingWords } from './act-form';

const doerWords = { conductor: 'the conductor', engineer: 'the engineer', crew: 'a crew member' } as const;

/** Who makes a step and who records it, in one line under the step's name. */
export function doerLine(step: PlanStep, role: CrewRole | null): string {
  if (step.doer === role) return 'Yours to make and to record.';
  const doer = doerWords[step.doer];
  return `${doer[0]?.toUpperCase() ?? ''}${doer.slice(1)} makes it, you record it.`;
}

/** What the bar says, from what has been put in: "Set: 1408 and 1412", "Released: 2 handbrakes", "Air charged: 110 psi". */
export function barWords(
  label: string,
  hand: 'set' | 'released' | null,
  reading: WireReading | undefined,
): string {
  if (reading === undefined) return label;
  if (hand === null) return `${label}: ${readingWords(reading)}`;
  const word = hand === 'set' ? 'Set' : 'Released';
  const cars = reading.cars ?? [];
  return cars.length > 0 ? `${word}: ${carList(cars)}` : `${word}: ${handbrakeWords(reading)}`;
}
