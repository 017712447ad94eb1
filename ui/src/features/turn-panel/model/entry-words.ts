import type { WireEntry } from '@stubpost/shared';
import { clockText } from '../../../lib/turn/time-text';
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
export function entryWords(
  entry: WireEntry,
  labels: StepLabels,
  zone: string,
  byId: ReadonlyMap<string, WireEntry> = new Map(),
): string {
  const target = (): string => targetWords(entry, labels, zone, byId);
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
      return `Withdrawal of ${target()}: ${entry.reason ?? ''}`;
    case 'corrected':
      return `Correction of ${target()},${newWords(entry, zone)}: ${entry.reason ?? ''}`;
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
    case 'agreed':
      return `Agrees with ${target()}`;
    case 'disagreed':
      return `Does not agree with ${target()}: ${entry.reason ?? ''}`;
    case 'ruled':
      return `Ruled: ${target()} counts`;
    case 'correction-approved':
      return `Approves: ${target()}`;
    case 'correction-declined':
      return `Declines: ${target()}. Reason: ${entry.reason ?? ''}`;
    case 'defect':
      return defectWords(entry);
    case 'tied-up':
      return tieUpWords(entry);
    default:
      return entry.kind;
  }
}

/** The entry that another speaks of: "handbrake set, 2 of 17:20:45 by hand". */
function targetWords(
  entry: WireEntry,
  labels: StepLabels,
  zone: string,
  byId: ReadonlyMap<string, WireEntry>,
): string {
  const target = byId.get(entry.target ?? '');
  if (target === undefined) return 'an entry that is not here';
  const rest = new Map([...byId].filter(([id]) => id !== entry.id));
  const words = lowerFirst(entryWords(target, labels, zone, rest));
  if (target.kind === 'corrected' || target.kind === 'withdrawn') return words;
  const at = target.observedAt === undefined ? '' : `, ${clockText(Date.parse(target.observedAt), zone)}`;
  return `${words}${at} ${SOURCE_WORDS[target.source]}`;
}

const lowerFirst = (text: string): string => text.charAt(0).toLowerCase() + text.slice(1);

/** What a correction says instead: " to 17:22:41", " to 17:22:41, 2". */
export function newWords({ observedAt, reading }: WireEntry, zone: string): string {
  const time = observedAt === undefined ? '' : ` to ${clockText(Date.parse(observedAt), zone)}`;
  const read = reading === undefined ? '' : readingWords({ reading });
  return time === '' && read !== '' ? ` to ${read.slice(2)}` : `${time}${read}`;
}

function defectWords(entry: WireEntry): string {
  const car = textOf(entry, 'car');
  const note = entry.note === undefined ? '' : `: ${entry.note}`;
  return `Bad order, ${car === '' ? 'the set' : `car ${car}`}, ${textOf(entry, 'cause')}${note}`;
}

function tieUpWords(entry: WireEntry): string {
  const { count = 0, cars = [] } = (entry['handbrakes'] ?? {}) as { count?: number; cars?: string[] };
  const checks = (entry['checks'] ?? []) as string[];
  const parts = [
    `Tied up, ${count} ${count === 1 ? 'handbrake' : 'handbrakes'} set${cars.length === 0 ? '' : `: ${cars.join(', ')}`}`,
    checks.length === 0 ? '' : `looked after: ${checks.join(', ')}`,
    entry['offAir'] === true ? 'cut off from air' : '',
    entry.reason === undefined ? '' : `reason: ${entry.reason}`,
  ];
  return parts.filter(Boolean).join('; ');
}

function reliefWords(entry: WireEntry): string {
  const comes = nameOf(entry, 'in');
  const face = entry['faceToFace'] === true ? ', face to face' : '';
  const goes = `${nameOf(entry, 'out')} relieved as ${textOf(entry, 'as')}`;
  return comes === '' ? `${goes}, nobody took over` : `${goes} by ${comes}${face}`;
}

function readingWords({ reading }: Pick<WireEntry, 'reading'>): string {
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
