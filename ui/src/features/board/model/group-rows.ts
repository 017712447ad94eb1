import type { Instant, WireTrack } from '@stubpost/shared';
import type { TurnNow } from '../../../lib/turn/turn-now';
import { findClashes, packRows, type Clash } from './pack-rows';
import { bySchedule, plannedStretch, trackStretch } from '../../../lib/turn/turn-times';

/** What a row of the picture stands for. */
export type RowSubject = 'track' | 'set';

/** One row of the picture and its head: a track or a set, or one line of those that have none yet. */
export interface BoardRow {
  id: string;
  subject: RowSubject;
  /** Label of the track or set; null where the turn has none yet. */
  label: string | null;
  /** Further rows of the same track or set, where trains overlap on it, count from 1. */
  part: number;
  turns: TurnNow[];
  clashes: Clash[];
}

const natural = new Intl.Collator('en', { numeric: true });

/**
 * The rows of the board. Tracks come in the order of the terminal, each with a row even when nothing stands on it, then
 * tracks that only turns name; sets only with a turn in view. What overlaps by plan on one track takes a further row
 * beside it, and turns without a track or set are packed into as few rows as needed, last.
 */
export function groupRows(
  turns: readonly TurnNow[],
  subject: RowSubject,
  tracks: readonly WireTrack[],
  now: Instant,
): BoardRow[] {
  const labelOf = (turn: TurnNow): string | null => (subject === 'track' ? turn.track : turn.set);
  const groups = new Map<string | null, TurnNow[]>();
  for (const label of rowLabels(turns.map(labelOf), subject, tracks)) groups.set(label, []);
  for (const turn of turns) groups.get(labelOf(turn))?.push(turn);
  return [...groups].flatMap(([label, members]) => rowsOf(label, members, subject, now));
}

function rowLabels(
  used: readonly (string | null)[],
  subject: RowSubject,
  tracks: readonly WireTrack[],
): (string | null)[] {
  const known = subject === 'track' ? tracks.map((track) => track.label) : [];
  const others = [...new Set(used)]
    .filter((label): label is string => label !== null && !known.includes(label))
    .sort((a, b) => natural.compare(a, b));
  return [...known, ...others, ...(used.includes(null) ? [null] : [])];
}

function rowsOf(label: string | null, members: TurnNow[], subject: RowSubject, now: Instant): BoardRow[] {
  const base = `${subject}-${label ?? 'none'}`;
  if (members.length === 0) return [{ id: base, subject, label, part: 0, turns: [], clashes: [] }];
  const occupants = members.map((turn) => ({ id: turn.id, turn, ...plannedStretch(turn) }));
  const clashes = label === null ? [] : clashesOf(members, now);
  return packRows(occupants).map((row, part) => ({
    id: part === 0 ? base : `${base}-${part}`,
    subject,
    label,
    part,
    turns: row.map((occupant) => occupant.turn).sort(bySchedule),
    clashes: clashes.filter((clash) => row.some(({ id }) => id === clash.first || id === clash.second)),
  }));
}

/** Overlaps on one track or set as things stand now; a turn that was annulled takes up nothing. */
function clashesOf(members: readonly TurnNow[], now: Instant): Clash[] {
  return findClashes(
    members
      .filter((turn) => turn.annulled === null)
      .map((turn) => ({ id: turn.id, ...trackStretch(turn, now) })),
  );
}

/** Every clash of the board by turn: the other turn's id. */
export function clashPartners(rows: readonly BoardRow[]): Map<string, Set<string>> {
  const partners = new Map<string, Set<string>>();
  const add = (id: string, other: string): void => {
    partners.set(id, (partners.get(id) ?? new Set()).add(other));
  };
  for (const { first, second } of rows.flatMap((row) => row.clashes)) {
    add(first, second);
    add(second, first);
  }
  return partners;
}
