import { actTimeOf, type WireCorrection, type WireEntry } from '@stubpost/shared';
import { clockText } from '../../../lib/turn/time-text';
import { entryWords, newWords, type StepLabels } from './entry-words';

/** One entry in the log: what counts, what it replaced, and what was said about it since. */
export interface LogLine {
  entry: WireEntry;
  words: string;
  /** What it said before its reading was corrected, the newest first; stays in sight, struck. */
  replacedWords: string[];
  /** The time that counts. */
  time: string;
  /** Times that it replaced, the newest first; they stay in sight, struck. */
  replaced: string[];
  isWithdrawn: boolean;
  /** Corrections and withdrawals in words, with who decided: "corrected 18:02:10 by L. Reyes: misread". */
  remarks: string[];
  /** When it came in, where that was more than a minute after it was made. */
  cameIn: string | null;
}

export interface LogContext {
  labels: StepLabels;
  zone: string;
  /** Changes of the record that need an approval, as the turn tells of them. */
  corrections: readonly WireCorrection[];
}

/** The entries of a turn as lines, the latest in the log first. All versions of every entry stay. */
export function logLines(entries: readonly WireEntry[], context: LogContext): LogLine[] {
  const byId = new Map(entries.map((entry) => [entry.id, entry]));
  const changes = entries.filter((entry) => entry.kind === 'corrected' || entry.kind === 'withdrawn');
  const states = new Map(context.corrections.map((correction) => [correction.entryId, correction]));
  const takenBack = withdrawnIds(changes, states);
  return [...entries]
    .sort((a, b) => b.sequence - a.sequence)
    .map((entry) => {
      const own = changes.filter((change) => rootOf(change, byId) === entry.id && !takenBack.has(change.id));
      const times = timesOf(entry, own, states);
      const texts = times.map((at) => clockText(at, context.zone));
      const versions = readingsOf(entry, own, states).map((reading) =>
        entryWords({ ...entry, reading }, context.labels, context.zone, byId),
      );
      return {
        entry,
        words: versions.at(-1) ?? '',
        replacedWords: versions.slice(0, -1).reverse(),
        time: texts.at(-1) ?? '',
        replaced: texts.slice(0, -1).reverse(),
        isWithdrawn: takenBack.has(entry.id),
        remarks: own.map((change) => remarkOf(change, states.get(change.id), context.zone)),
        cameIn: cameInOf(entry, context.zone),
      };
    });
}

/** The entry that a change is about in the end: a correction of a correction is one more of the entry itself. */
function rootOf(change: WireEntry, byId: ReadonlyMap<string, WireEntry>): string | undefined {
  let root = change;
  for (let steps = 0; root.kind === 'corrected' && steps < byId.size; steps += 1) {
    const next = byId.get(root.target ?? '');
    if (next?.kind !== 'corrected') return root.target;
    root = next;
  }
  return root.target;
}

type States = ReadonlyMap<string, WireCorrection>;

const hasEffect = (change: WireEntry, states: States): boolean =>
  (states.get(change.id)?.state ?? 'approved') === 'approved';

/** Ids of the entries that a withdrawal with effect takes back; one that was itself taken back has none. */
function withdrawnIds(changes: readonly WireEntry[], states: States): ReadonlySet<string> {
  const effective = changes.filter((change) => change.kind === 'withdrawn' && hasEffect(change, states));
  const takenBack = new Set<string>();
  // The log is in the order of receipt: a withdrawal of a withdrawal stands behind it.
  for (const change of [...effective].reverse()) {
    if (change.target !== undefined && !takenBack.has(change.id)) takenBack.add(change.target);
  }
  return takenBack;
}

/** The corrections that have effect, in the order in which they were made. */
function corrections(own: readonly WireEntry[], states: States): WireEntry[] {
  return own
    .filter((change) => change.kind === 'corrected' && hasEffect(change, states))
    .sort((a, b) => Date.parse(actTimeOf(a) ?? '') - Date.parse(actTimeOf(b) ?? ''));
}

function readingsOf(entry: WireEntry, own: readonly WireEntry[], states: States): WireEntry['reading'][] {
  const later = corrections(own, states).flatMap(({ reading }) => (reading === undefined ? [] : [reading]));
  return [entry.reading, ...later];
}

function timesOf(entry: WireEntry, own: readonly WireEntry[], states: States): number[] {
  const first = Date.parse(actTimeOf(entry) ?? entry.receivedAt);
  const later = corrections(own, states).flatMap((change) =>
    change.observedAt === undefined ? [] : [Date.parse(change.observedAt)],
  );
  return [first, ...later].filter((at, index, all) => at !== all[index - 1]);
}

const promptMilliseconds = 60_000;

function cameInOf(entry: WireEntry, zone: string): string | null {
  const receivedAt = Date.parse(entry.receivedAt);
  const madeAt = Date.parse(actTimeOf(entry) ?? entry.receivedAt);
  return receivedAt - madeAt > promptMilliseconds ? clockText(receivedAt, zone) : null;
}

function remarkOf(change: WireEntry, state: WireCorrection | undefined, zone: string): string {
  const verb = change.kind === 'withdrawn' ? 'withdrawn' : 'corrected';
  const by = change.by === null ? '' : ` by ${change.by.name}`;
  const at = clockText(Date.parse(actTimeOf(change) ?? change.receivedAt), zone);
  const reason = change.reason ?? '';
  if (state === undefined) return `${verb} ${at}${by}: ${reason}`;
  const asked = change.kind === 'withdrawn' ? 'withdrawal' : `correction${newWords(change, zone)}`;
  if (state.state === 'waiting') return `${asked} asked for ${at}${by}: ${reason}. It waits for a supervisor`;
  const decider = state.decidedBy?.name === undefined ? '' : ` by ${state.decidedBy.name}`;
  const decided = state.decidedAt === undefined ? '' : ` ${clockText(Date.parse(state.decidedAt), zone)}`;
  if (state.state === 'declined') {
    return `${asked} asked for ${at}${by}: ${reason}. Declined${decided}${decider}: ${state.declinedBecause ?? ''}`;
  }
  return `${verb} ${at}${by}: ${reason}. Approved${decided}${decider}`;
}
