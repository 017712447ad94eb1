import { sourceWords, type EntrySource, type WireReading, type WireStep } from '@stubpost/shared';
import { formatClock } from '../../../lib/time-display';
import { readingWords } from './act-form';

/** What a record is called in one line: the act, its time, how it is known. */
export interface RecordFacts {
  label: string;
  at: string;
  source: EntrySource | null;
  saidBy: string | null;
  reading: WireReading | null;
}

/** "Handbrake set 17:19:52", "Cab brake check by radio, 17:22:00, said by Lindqvist", "Ends changed 17:24:10, entered later". */
export function recordLine({ label, at, source, saidBy, reading }: RecordFacts, zone: string): string {
  const time = formatClock(at, zone);
  const read = readingWords(reading);
  const what = read === '' ? label : `${label}, ${read},`;
  if (source === 'by-radio')
    return `${what} by radio, ${time}${saidBy === null ? '' : `, said by ${saidBy}`}`;
  if (source === 'entered-later') return `${what} ${time}, entered later`;
  return source === 'by-feed' ? `${what} ${time}, by feed` : `${what} ${time}`;
}

/** A recorded step in one line; its name alone while it is open. */
export function recordWords(step: WireStep, zone: string): string {
  if (step.doneAt === null) return step.shortLabel;
  return recordLine({ ...step, label: step.shortLabel, at: step.doneAt }, zone);
}

/** How a time is known and by whom, for a list of accounts: "by hand, Ortiz", "by radio, Lindqvist, written by Halvorsen". */
export function accountWords(account: {
  source: EntrySource;
  by: string | null;
  saidBy: string | null;
}): string {
  const how = sourceWords[account.source];
  if (account.saidBy !== null)
    return `${how}, said by ${account.saidBy}${account.by === null ? '' : `, written by ${account.by}`}`;
  return account.by === null ? how : `${how}, ${account.by}`;
}
