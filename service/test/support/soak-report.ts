import { appendFileSync } from 'node:fs';

/** What one part of a long run has done. */
export interface SoakFigures {
  part: string;
  rounds: number;
  /** Entries whose receipt had arrived. */
  acknowledged: number;
  lost: number;
  doubled: number;
  chain: 'whole' | 'broken' | 'not kept here';
}

/**
 * Leaves the figures of some rounds of a part for `npm run soak`, where it asked for them; `npm test` does
 * not. A part that is broken off half way has left what it came to.
 */
export function noteSoak(figures: SoakFigures): void {
  const { SOAK_REPORT } = process.env;
  if (SOAK_REPORT !== undefined) appendFileSync(SOAK_REPORT, `${JSON.stringify(figures)}\n`);
}
