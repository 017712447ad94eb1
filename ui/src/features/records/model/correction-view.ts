import type { ListedCorrection, WireReading } from '@stubpost/shared';
import { formatClock, formatStamp } from '../../../lib/time-display';

/** One side of a correction: what is written under each heading. */
export interface SideRow {
  name: string;
  recorded: string;
  askedFor: string;
}

/** Old beside new, row by row; only rows in which something is to change, or everything for a withdrawal. */
export function sidesOf(correction: ListedCorrection): SideRow[] {
  const { kind, oldAt, newAt, oldReading, newReading, zone } = correction;
  const clock = (at: string): string => formatClock(at, zone);
  if (kind === 'withdrawn') {
    return [
      { name: 'Time', recorded: clock(oldAt), askedFor: 'not to stand' },
      ...readingRow(oldReading, null, 'not to stand'),
    ];
  }
  return [
    { name: 'Time', recorded: clock(oldAt), askedFor: newAt === null ? 'as it is' : clock(newAt) },
    ...readingRow(oldReading, newReading, 'as it is'),
  ];
}

function readingRow(old: WireReading | null, changed: WireReading | null, unchanged: string): SideRow[] {
  if (old === null && changed === null) return [];
  const askedFor = changed === null ? unchanged : readingText(changed);
  return [{ name: 'Read off', recorded: old === null ? 'nothing' : readingText(old), askedFor }];
}

/** "2 handbrakes, cars 1408, 1412", "110 psi", "90 to 88 psi in 60 s". */
export function readingText({ count, cars = [], brakePipePsi, p0, p1, seconds }: WireReading): string {
  const brakes = count === undefined ? '' : `${count} ${count === 1 ? 'handbrake' : 'handbrakes'}`;
  const named = cars.length === 0 ? '' : `${cars.length === 1 ? 'car' : 'cars'} ${cars.join(', ')}`;
  const parts = [
    [brakes, named].filter(Boolean).join(', '),
    brakePipePsi === undefined ? '' : `${brakePipePsi} psi`,
    p0 === undefined || p1 === undefined ? '' : `${p0} to ${p1} psi`,
    seconds === undefined ? '' : `in ${seconds} s`,
  ];
  return parts.filter(Boolean).join(' ') || 'nothing';
}

/** "Train 1742, track 3: cab brake check". */
export function subjectText({ inboundTrain, outboundTrain, track, whatLabel }: ListedCorrection): string {
  const train = outboundTrain ?? inboundTrain ?? '';
  const where = track === null ? '' : `, track ${track}`;
  return `Train ${train}${where}: ${whatLabel.charAt(0).toLowerCase()}${whatLabel.slice(1)}`;
}

/** Who asked when: "Asked for Tue 3 Mar 18:02 by A. Ortiz". */
export function askedText({ askedAt, by, kind, zone }: ListedCorrection): string {
  const what = kind === 'withdrawn' ? 'Withdrawal asked for' : 'Correction asked for';
  return `${what} ${formatStamp(askedAt, zone)}${by === null ? '' : ` by ${by.name}`}`;
}

/** What was decided, by whom and why; empty while it waits. */
export function decidedText({
  state,
  decidedAt,
  decidedBy,
  declinedBecause,
  zone,
}: ListedCorrection): string {
  if (state === 'waiting' || decidedAt === undefined) return '';
  const by = decidedBy === null || decidedBy === undefined ? '' : ` by ${decidedBy.name}`;
  const because = declinedBecause === undefined ? '' : `: ${declinedBecause}`;
  return `${state === 'approved' ? 'Approved' : 'Declined'} ${formatStamp(decidedAt, zone)}${by}${because}`;
}

/** What a person may do about a correction that waits. */
export type MayDecide = 'yes' | 'own' | 'no';

/** Nobody decides on their own request; and only a supervisor of the terminal decides at all. */
export function mayDecide(
  correction: ListedCorrection,
  person: { id: string; isSupervisorHere: boolean },
): MayDecide {
  if (!person.isSupervisorHere) return 'no';
  return correction.by?.personId === person.id ? 'own' : 'yes';
}
