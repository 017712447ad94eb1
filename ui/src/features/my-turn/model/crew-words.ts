import type { CrewRole } from '@stubpost/shared';

/** Jobs on a turn, as they stand at the head of a line. */
export const CREW_WORDS: Record<CrewRole, string> = { conductor: 'Conductor', engineer: 'Engineer' };
