import type { WireEntry } from '@stubpost/shared';
import { SOURCE_WORDS } from '../../../components/words';
import { formatTime } from '../../../lib/time-display';

/** Labels of steps by key, from the turn. */
export type StepLabels = ReadonlyMap<string, string>;

const textOf = (entry: WireEntry, field: string): string => {
  const value = entry[field];
  return typeof value === 'string' ? value : '';
};

const nameOf = (entry: WireEntry, field: string): string => {
  const value = entry[field];
  if (typeof value === 'string') return value;
  return typeof value === 'object' && value !== null && 'name' in value ? String(value.name) : '';
};

/** What an entry says, in words: "Handbrake set, 2: 2235, 4107". */
export function entryWords(entry: WireEntry, labels: StepLabels, zone: string): string {
  const step = labels.get(entry.step ?? '') ?? entry.step ?? '';
  const time = (field: string): string => {
    const text = textOf(entry, field);
    return text === '' ? '' : formatTime(text, zone);
  };
  switch (entry.kind) {
    case 'arrival':
      return 'Arrival';
    case 'departure':
      return 'Departure';
    case 'expected-arrival':
      return `Expected ${time('expectedAt')}`;
    case 'step-done':
      return `${step}${readingWords(entry)}`;
    case 'cannot-do':
      return `${step} cannot be done: ${entry.reason ?? ''}`;
    case 'withdrawn':
      return `Withdrawn: ${entry.reason ?? ''}`;
    case 'corrected':
      return `Corrected: ${entry.reason ?? ''}`;
    case 'crew':
      return `${nameOf(entry, 'person')} as ${textOf(entry, 'as')}`;
    case 'relief':
      return reliefWords(entry);
    case 'briefing':
      return 'Briefing, all agree';
    case 'track':
      return `Track ${textOf(entry, 'track')}`;
    case 'set':
      return `Set ${textOf(entry, 'set')}`;
    case 'hold':
      return `Held to ${time('until')}: ${entry.reason ?? ''}`;
    case 'annulled':
      return `Annulled: ${entry.reason ?? ''}`;
    case 'blue-signal-up':
      return 'Blue signal up';
    case 'blue-signal-down':
      return 'Blue signal down';
    case 'note':
      return `Note: ${entry.note ?? ''}`;
    default:
      return entry.kind;
  }
}

function reliefWords(entry: WireEntry): string {
  const comes = nameOf(entry, 'in');
  const face = entry['faceToFace'] === true ? ', face to face' : '';
  const goes = `${nameOf(entry, 'out')} relieved as ${textOf(entry, 'as')}`;
  return comes === '' ? `${goes}, nobody took over` : `${goes} by ${comes}${face}`;
}

function readingWords({ reading }: WireEntry): string {
  if (reading === undefined) return '';
  const cars = reading.cars === undefined || reading.cars.length === 0 ? '' : `: ${reading.cars.join(', ')}`;
  const parts = [
    reading.count === undefined ? '' : `${reading.count}${cars}`,
    reading.brakePipePsi === undefined ? '' : `${reading.brakePipePsi} psi`,
    reading.p0 === undefined || reading.p1 === undefined ? '' : `${reading.p0} to ${reading.p1} psi`,
    reading.seconds === undefined ? '' : `in ${reading.seconds} s`,
  ].filter(Boolean);
  return parts.length === 0 ? '' : `, ${parts.join(', ')}`;
}

/** How an entry is known and by whom: "by radio, P. Varga (R. Hallam)", "by feed". */
export function knownWords(entry: Pick<WireEntry, 'source' | 'saidBy' | 'by'>): string {
  const writer = entry.by?.name;
  const how = SOURCE_WORDS[entry.source];
  if (entry.saidBy !== undefined)
    return `${how}, ${entry.saidBy}${writer === undefined ? '' : ` (${writer})`}`;
  return writer === undefined ? how : `${how}, ${writer}`;
}

/** Ids of the entries that a later entry takes back. */
export function withdrawnIds(entries: readonly WireEntry[]): ReadonlySet<string> {
  return new Set(
    entries.flatMap((entry) =>
      entry.kind === 'withdrawn' && entry.target !== undefined ? [entry.target] : [],
    ),
  );
}
