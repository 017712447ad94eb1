import type { ImportProblem } from '@stubpost/shared';

/** Thrown where reading cannot go on; says why in a way that stands in the list of problems. */
export class FeedRefused extends Error {
  readonly problem: ImportProblem;

  constructor(parts: { file: string | null; line?: number | null; code: string; message: string }) {
    super(parts.message);
    this.problem = { severity: 'refused', line: null, ...parts };
  }
}
