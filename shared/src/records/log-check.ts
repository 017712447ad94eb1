import { GapBook } from './log-gaps';
import { readLogLine, type LineRefusal, type LogLine } from './log-line';
import { inspectSeal, type DueLink, type SealFinding } from './inspect-seal';
import { noPreviousHash } from './seal';
import type { EntryPlace, LogFault, LogHead, LogNote, LogVerdict } from './log-verdict';

/** More faults than this are counted, not kept: after the first hundreds nobody reads on. Our choice. */
export const mostFaultsKept = 500;
const mostSequencesNamed = 20;

/** What a check needs: SHA-256 of the UTF-8 bytes of a text in lower-case hexadecimal, and heads from elsewhere. */
export interface LogCheckOptions {
  sha256: (text: string) => string;
  /** Heads that were published, in any order. Every one of them must be met. */
  heads?: readonly LogHead[] | undefined;
}

/** An entry with the newest number; two of them when a number stands twice. */
interface Top extends EntryPlace {
  hash: string;
  finding: SealFinding;
  fault: LogFault | null;
}

/**
 * Checks a log line by line, whatever its length, and names the first changed, missing, added or moved entry.
 *
 * The lines must be what `formatLogLine` writes, so that not one byte can differ; each entry must fit its seal; each
 * must be chained to the one before; numbers run without a gap; and every published head must be met, the newest by
 * the end. A log that begins after no. 1 must begin right after a given head. What is found broken is not believed any
 * further than its place.
 */
export class LogCheck {
  private lines = 0;
  private entries = 0;
  /** Lines since the last entry that could not be read: their numbers are not missing, they are unreadable. */
  private unreadable = 0;
  private tops: Top[] = [];
  private expected = 0;
  private first: LogVerdict['first'] = null;
  private last: LogVerdict['last'] = null;
  private met: LogHead[] = [];
  private faults: LogFault[] = [];
  private faultCount = 0;
  private readonly gaps = new GapBook();
  private readonly moved = new WeakSet<EntryPlace>();
  private readonly bodiless: number[] = [];
  private bodilessCount = 0;
  private readonly heads: readonly LogHead[];
  /** More than one where they contradict each other: then one of them is not met. */
  private readonly headsBySequence: ReadonlyMap<number, readonly LogHead[]>;

  constructor(private readonly options: LogCheckOptions) {
    this.heads = options.heads ?? [];
    const bySequence = new Map<number, LogHead[]>();
    for (const head of this.heads)
      bySequence.set(head.sequence, [...(bySequence.get(head.sequence) ?? []), head]);
    this.headsBySequence = bySequence;
  }

  /** Takes the next line, without its end. */
  take(text: string): void {
    const read = readLogLine(text);
    if (!read.ok) {
      this.takeUnreadable(read.error);
      return;
    }
    this.lines += 1;
    this.entries += 1;
    this.place(read.value);
    this.unreadable = 0;
  }

  /** Takes a line that is not even a text. */
  takeUnreadable(refusal: LineRefusal): void {
    this.lines += 1;
    this.unreadable += 1;
    this.note({ kind: 'unreadable', line: this.lines, ...refusal });
  }

  /** The outcome. `isCutShort` when the last line had no end. */
  end({ isCutShort = false } = {}): LogVerdict {
    this.settleTops(this.tops[0]);
    for (const { from, to, early } of this.gaps.open()) {
      const { line } = early;
      if (from === 1 && to + 1 === this.first?.sequence) this.note({ kind: 'beginning', line, to });
      else this.note({ kind: 'missing', line, from, to });
    }
    if (isCutShort) this.note({ kind: 'unended', line: this.lines });
    this.findCutTail();
    this.faults.sort((a, b) => a.line - b.line);
    const newest = this.met.reduce<LogHead | null>(
      (best, head) => (best === null || head.sequence > best.sequence ? head : best),
      null,
    );
    return {
      isWhole: this.faultCount === 0,
      lines: this.lines,
      entries: this.entries,
      first: this.first,
      last: this.last,
      metHead: newest,
      metHeads: this.met.length,
      faults: this.faults,
      faultCount: this.faultCount,
      notes: this.notes(newest),
    };
  }

  /** The number of the last entry, and the hash the next one must be chained to; null before the first. */
  get newest(): { sequence: number; hash: string } | null {
    return this.last === null ? null : { sequence: this.last.sequence, hash: this.last.hash };
  }

  private place(entry: LogLine): void {
    const due = this.dueFor(entry);
    const finding = inspectSeal(entry, { sha256: this.options.sha256, due });
    const sequence = trustedSequence(entry, finding, due);
    const place: EntryPlace = { line: this.lines, sequence, id: entry.id };
    const fault = this.faultOf(entry, finding, place);
    const top: Top = { ...place, hash: entry.hash, finding, fault };
    if (this.first === null) this.begin(entry, top);
    else this.follow(entry, top);
    this.compareWithHead(entry, top);
    if (entry.body === null) this.noteWithoutBody(sequence);
  }

  /** The number and the link that the entry in this place must have, as far as that is known. */
  private dueFor(entry: LogLine): DueLink {
    if (this.first !== null) return { sequence: this.expected + this.unreadable, hash: this.tops[0]?.hash };
    if (entry.sequence === 1 || entry.previousHash === noPreviousHash)
      return { sequence: 1, hash: noPreviousHash };
    const linked = this.heads.find(({ hash }) => hash === entry.previousHash);
    if (linked !== undefined) return { sequence: linked.sequence + 1, hash: linked.hash };
    return { sequence: undefined, hash: this.headsAt(entry.sequence - 1)[0]?.hash };
  }

  private headsAt(sequence: number): readonly LogHead[] {
    return this.headsBySequence.get(sequence) ?? [];
  }

  private faultOf(entry: LogLine, { part }: SealFinding, place: EntryPlace): LogFault | null {
    if (part !== null) return this.note({ kind: 'changed', part, ...place });
    if (!entry.isCanonical) return this.note({ kind: 'rewritten', ...place });
    return null;
  }

  private begin(entry: LogLine, top: Top): void {
    this.first = { sequence: top.sequence, receivedAt: entry.receivedAt };
    const before = top.sequence - 1;
    const heads = before === 0 ? [startOfLog] : this.headsAt(before);
    if (heads.length === 0 && before > this.unreadable) this.gaps.add({ from: 1, to: before, early: top });
    if (this.unreadable === 0) {
      for (const head of heads) {
        if (head.hash === entry.previousHash) this.meet(head);
        else if (top.fault === null) this.note({ kind: 'wrong-start', head, ...placeOf(top) });
      }
    }
    this.advance(entry, top);
  }

  private follow(entry: LogLine, top: Top): void {
    if (top.sequence >= this.expected) {
      const missing = top.sequence - this.expected;
      if (missing === 0) this.settleTops(this.linkTo(entry), top);
      else {
        this.settleTops(this.tops[0]);
        if (missing > this.unreadable)
          this.gaps.add({ from: this.expected, to: top.sequence - 1, early: top });
      }
      this.advance(entry, top);
      return;
    }
    const gap = this.gaps.fill(top.sequence);
    if (gap !== null) this.noteMoved(gap.early, top);
    else if (top.sequence === this.expected - 1) this.tops.push(top);
    else if (top.fault === null) this.note({ kind: 'repeated', isSame: false, ...placeOf(top) });
  }

  /** One that comes late, and once the one before which it should have stood. */
  private noteMoved(...places: EntryPlace[]): void {
    for (const place of places) {
      if (this.moved.has(place)) continue;
      this.moved.add(place);
      this.note({ kind: 'moved', ...placeOf(place) });
    }
  }

  private meet(head: LogHead): void {
    if (head.sequence > 0) this.met.push(head);
  }

  private advance(entry: LogLine, top: Top): void {
    this.tops = [top];
    this.expected = top.sequence + 1;
    this.last = { sequence: top.sequence, hash: entry.hash, receivedAt: entry.receivedAt };
  }

  /** Which of the entries with the number before this one is chained to; undefined when it is none of them. */
  private linkTo(entry: LogLine): Top | undefined {
    const byHash = this.tops.find(({ hash }) => hash === entry.previousHash);
    if (byHash !== undefined) return byHash;
    // The hash of the one before was changed: what it should have been is what this one was chained to.
    const bySum = this.tops.find(({ finding }) => finding.computedHash === entry.previousHash);
    if (bySum?.fault?.kind === 'changed' && bySum.fault.part === 'envelope') bySum.fault.part = 'hash';
    return bySum;
  }

  /** Once the next entry is known it is clear which of several with one number belongs there. */
  private settleTops(linked: Top | undefined, next?: Top): void {
    const [first] = this.tops;
    if (first !== undefined && linked === undefined && next !== undefined) this.noteBrokenLink(first, next);
    const kept = linked ?? first;
    for (const top of this.tops) {
      if (top !== kept && top.fault === null)
        this.note({ kind: 'repeated', isSame: top.hash === kept?.hash, ...placeOf(top) });
    }
  }

  private noteBrokenLink(before: Top, next: Top): void {
    const isNamed = this.tops.some(({ fault }) => fault !== null) || next.fault !== null;
    if (!isNamed) this.note({ kind: 'resealed', next: placeOf(next), ...placeOf(before) });
  }

  private compareWithHead(entry: LogLine, top: Top): void {
    for (const head of this.headsAt(top.sequence)) {
      if (head.hash === entry.hash) this.meet(head);
      else if (top.fault === null) this.note({ kind: 'not-the-head', head, ...placeOf(top) });
    }
  }

  private findCutTail(): void {
    const lastSequence = this.last?.sequence ?? 0;
    const later = this.heads.filter(({ sequence }) => sequence > lastSequence);
    const [head] = later.sort((a, b) => b.sequence - a.sequence);
    if (head !== undefined) this.note({ kind: 'cut', line: this.lines, lastSequence, head });
  }

  private noteWithoutBody(sequence: number): void {
    this.bodilessCount += 1;
    if (this.bodiless.length < mostSequencesNamed) this.bodiless.push(sequence);
  }

  private notes(newest: LogHead | null): LogNote[] {
    const notes: LogNote[] = [];
    const [first, last] = [this.first?.sequence ?? 0, this.last?.sequence ?? 0];
    if (this.heads.length === 0) notes.push({ kind: 'no-head' });
    else if (newest !== null && newest.sequence < last)
      notes.push({ kind: 'after-head', from: Math.max(newest.sequence + 1, first), to: last });
    if (first > 1 && this.headsAt(first - 1).length > 0) notes.push({ kind: 'before-start', to: first - 1 });
    if (this.bodilessCount > 0)
      notes.push({ kind: 'without-body', count: this.bodilessCount, sequences: this.bodiless });
    return notes;
  }

  private note<Fault extends LogFault>(fault: Fault): Fault {
    this.faultCount += 1;
    if (this.faults.length < mostFaultsKept) this.faults.push(fault);
    return fault;
  }
}

/** What stands before no. 1. */
const startOfLog: LogHead = { sequence: 0, hash: noPreviousHash };

/** A number that does not fit the seal is not believed where the chain says what it must be. */
function trustedSequence(entry: LogLine, finding: SealFinding, due: DueLink): number {
  if (due.sequence === undefined || finding.part === null) return entry.sequence;
  const isDue = finding.part === 'sequence' || entry.previousHash === due.hash;
  return isDue ? due.sequence : entry.sequence;
}

const placeOf = ({ line, sequence, id }: EntryPlace): EntryPlace => ({ line, sequence, id });
