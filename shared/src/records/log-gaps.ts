import type { EntryPlace } from './log-verdict';

/** Numbers that were not there where they belong, both ends included. */
export interface Gap {
  from: number;
  to: number;
  /** The entry that stands where they should have stood. */
  early: EntryPlace;
}

/** Numbers that are missing so far. One that turns up later leaves its gap, which may part in two. */
export class GapBook {
  private readonly gaps: Gap[] = [];

  add(gap: Gap): void {
    this.gaps.push(gap);
  }

  /** Takes a number out of the gap it lies in, and gives that gap as it was; null when it lies in none. */
  fill(sequence: number): Gap | null {
    const index = this.gaps.findIndex(({ from, to }) => from <= sequence && sequence <= to);
    const gap = this.gaps[index];
    if (gap === undefined) return null;
    const rest = [
      { ...gap, to: sequence - 1 },
      { ...gap, from: sequence + 1 },
    ].filter(({ from, to }) => from <= to);
    this.gaps.splice(index, 1, ...rest);
    return gap;
  }

  open(): readonly Gap[] {
    return this.gaps;
  }
}
