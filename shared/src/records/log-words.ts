import { assertNever } from '../lib/assert-never';
import type { LineRefusal } from './log-line';
import type { ChangedPart, EntryPlace, LogFault, LogHead, LogNote } from './log-verdict';

/** A number as people read it: 1204 is "1,204". */
export const formatCount = (count: number): string => count.toLocaleString('en-US');

const no = (sequence: number): string => `no. ${formatCount(sequence)}`;
const nos = (from: number, to: number): string =>
  from === to ? no(from) : `${no(from)} to ${formatCount(to)}`;
const at = (line: number): string => `Line ${formatCount(line)}`;
const who = ({ line, sequence, id }: EntryPlace): string => `${at(line)}, ${no(sequence)} (${id})`;
const head = ({ date, sequence, hash }: LogHead): string =>
  `${date === undefined ? 'the published head' : `the head of ${date}`}, ${no(sequence)} ${hash.slice(0, 12)}…`;

/**
 * What is wrong with a log, in a sentence that says where, and what that means:
 * "Line 1,204, no. 1,204 (7a1d…): what the entry says was changed after it was sealed."
 */
export function formatLogFault(fault: LogFault): string {
  switch (fault.kind) {
    case 'unreadable':
      return `${at(fault.line)} cannot be read: ${refusalWords(fault)}.`;
    case 'rewritten':
      return `${who(fault)}: says the same, but is not written as the log writes it (blanks, order, line ends): the file was touched after it was exported.`;
    case 'changed':
      return `${who(fault)}: ${changedWords[fault.part]} after it was sealed.`;
    case 'resealed':
      return `${who(fault)}: was changed and sealed anew: it is not the entry that ${no(fault.next.sequence)} in line ${formatCount(fault.next.line)} was chained to.`;
    case 'missing':
      return `${at(fault.line)}: ${nos(fault.from, fault.to)} ${fault.from === fault.to ? 'is' : 'are'} missing before it.`;
    case 'moved':
      return `${who(fault)}: does not stand in the order of the log.`;
    case 'repeated':
      return fault.isSame
        ? `${who(fault)}: the same entry once more: the line was added.`
        : `${who(fault)}: another entry with a number that the log has already: the line was added.`;
    case 'beginning':
      return `${at(fault.line)}: ${nos(1, fault.to)} ${fault.to === 1 ? 'is' : 'are'} not in the file, and no given head stands at ${no(fault.to)}. A file that begins on a later day needs the published head of the day before.`;
    default:
      return headFaultWords(fault);
  }
}

/** The same of a log without lines, such as a table: "No. 1,204 (7a1d…): what the entry says was changed …". */
export function formatEntryFault(fault: LogFault): string {
  const words = formatLogFault(fault)
    .replace(/^Line [\d,]+[,:]? /, '')
    .replace(/ in line [\d,]+/, '')
    .replace(/ before it\.$/, '.');
  return words.charAt(0).toUpperCase() + words.slice(1);
}

type HeadFault = Extract<LogFault, { kind: 'wrong-start' | 'not-the-head' | 'cut' | 'unended' }>;

function headFaultWords(fault: HeadFault): string {
  switch (fault.kind) {
    case 'wrong-start':
      return fault.head.sequence === 0
        ? `${who(fault)}: is not chained to the beginning of a log.`
        : `${who(fault)}: is not chained to ${head(fault.head)}: what stands before it is not what was published.`;
    case 'not-the-head':
      return `${who(fault)}: does not have the hash of ${head(fault.head)}: it, or something before it, was changed and the chain made anew.`;
    case 'cut':
      return `${at(fault.line)}: the log ends at ${no(fault.lastSequence)}, but ${head(fault.head)} stands after it: the tail is cut off.`;
    case 'unended':
      return `${at(fault.line)}: has no end: the file stops in the middle.`;
    default:
      return assertNever(fault);
  }
}

const changedWords: Record<ChangedPart, string> = {
  body: 'what the entry says was changed',
  bodyHash: 'its body hash was changed',
  hash: 'its hash was changed',
  previousHash: 'its previous hash was changed, so that it is not chained to the entry before',
  sequence: 'its number was changed',
  envelope: 'its id, its time of receipt or its hash was changed',
  several: 'several of its parts were changed',
};

function refusalWords({ reason, member }: LineRefusal): string {
  switch (reason) {
    case 'empty':
      return 'it is empty';
    case 'not-utf-8':
      return 'its bytes are no UTF-8 text';
    case 'not-json':
      return 'it is not JSON';
    case 'not-an-entry':
      return 'it is not an entry';
    case 'member':
      return `"${member ?? ''}" is missing, unknown or not what it must be`;
    default:
      return assertNever(reason);
  }
}

/** What could not be checked, in a sentence. */
export function formatLogNote(note: LogNote): string {
  switch (note.kind) {
    case 'no-head':
      return 'No published head was given. A tail that was cut off, or a chain that was made anew as a whole, cannot be seen.';
    case 'after-head':
      return `${nos(note.from, note.to)}: after the newest given head. The next head that is published will vouch for them.`;
    case 'before-start':
      return `${nos(1, note.to)}: not in the file. It begins right after a published head, which it is chained to.`;
    case 'without-body':
      return `${formatCount(note.count)} ${note.count === 1 ? 'entry has' : 'entries have'} no body here (${note.sequences.map(no).join(', ')}${note.sequences.length < note.count ? ' …' : ''}): taken out when its time was over, or of a terminal this file is not for. The chain holds; what they said cannot be checked.`;
    default:
      return assertNever(note);
  }
}
