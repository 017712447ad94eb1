import type { CrewRole } from '@stubpost/shared';

/*
 * Reasons that stand as buttons, so that gloves need not type. Common practice, no published source; any other reason is
 * put in words.
 */

const crewRoles: readonly CrewRole[] = ['engineer', 'conductor'];

/** Why a step cannot be done, for somebody with this job on the turn: nobody waits for themselves. */
export function cannotDoReasons(own: CrewRole | null): string[] {
  const others = crewRoles.filter((role) => role !== own);
  return [
    ...others.map((role) => `Waiting for the ${role}`),
    'Equipment will not answer',
    'Not safe to go there',
  ];
}

/** Why an entry is taken back before the train has left. */
export const withdrawReasons = ['Wrong step', 'Wrong train', 'Wrong time'] as const;

/** Why an entry is to be corrected after the train has left. */
export const correctionReasons = ['Misread', 'Wrong step', 'Wrong train', 'Wrong time'] as const;

/** Why a step written from the radio is not so. */
export const notSoReasons = ['Not made yet', 'Wrong train', 'Somebody else said it'] as const;

/** Why a set is left with securement open. */
export const tieUpReasons = [
  'Mechanical has the set',
  'Set stays with its next crew',
  'Handbrake will not hold',
] as const;

/** Why a turn does not run. */
export const annulReasons = ['No crew', 'Equipment failed', 'Track closed', 'Train runs elsewhere'] as const;
