import type { Instant } from '@stubpost/shared';

/** A thing that takes up a row for a while; `to` is not included. */
export interface Occupant {
  id: string;
  from: Instant;
  to: Instant;
}

/** Two occupants of one place whose times overlap. */
export interface Clash {
  first: string;
  second: string;
  from: Instant;
  to: Instant;
}

const byStart = (a: Occupant, b: Occupant): number =>
  a.from - b.from || a.to - b.to || (a.id < b.id ? -1 : Number(a.id > b.id));

/**
 * Puts occupants into as few rows as will hold them without overlap: each goes, in order of its start, into the first
 * row that is free by then. That many rows are needed at the busiest moment, so fewer cannot do. The same occupants
 * give the same rows whatever order they come in.
 */
export function packRows<Item extends Occupant>(occupants: readonly Item[]): Item[][] {
  const rows: Item[][] = [];
  for (const occupant of [...occupants].sort(byStart)) {
    const free = rows.find((row) => (row.at(-1)?.to ?? -Infinity) <= occupant.from);
    if (free === undefined) rows.push([occupant]);
    else free.push(occupant);
  }
  return rows;
}

/** Every pair that claims the same place at the same time, in order of where the overlap begins. */
export function findClashes(occupants: readonly Occupant[]): Clash[] {
  const sorted = [...occupants].sort(byStart);
  const clashes: Clash[] = [];
  sorted.forEach((first, index) => {
    for (const second of sorted.slice(index + 1)) {
      if (second.from >= first.to) break;
      clashes.push({
        first: first.id,
        second: second.id,
        from: second.from,
        to: Math.min(first.to, second.to),
      });
    }
  });
  return clashes.sort((a, b) => a.from - b.from);
}
