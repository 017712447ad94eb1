import type { Instant } from '../lib/instant';
import { accountOf } from './account';
import type { Entry, EntryAuthor } from './entry';
import { weighAccounts } from './rulings';
import { latestObserved, ofKind, type EntryOf } from './standing-entries';
import { isUndo } from './undo';
import { rootOf, withdrawnIds } from './withdrawals';

/** What changes the record: a correction or a withdrawal. */
export type RecordChange = EntryOf<'corrected'> | EntryOf<'withdrawn'>;

/** What somebody decided about a change of the record that waits for it. */
export interface Decision {
  entryId: string;
  isApproved: boolean;
  at: Instant;
  by: EntryAuthor | null;
  /** Why it was declined; null for an approval. */
  reason: string | null;
}

/** Which changes of the record need somebody else's yes, and which of them have it. */
export interface Approvals {
  /** Ids of corrections and withdrawals that were made after the departure and are no exception. */
  needed: ReadonlySet<string>;
  /** The decision that counts, by the id of the change; the latest observed of those by another person. */
  decisions: ReadonlyMap<string, Decision>;
  /** Ids of corrections and withdrawals that change nothing: they wait, were declined, or take back a decision. */
  idle: ReadonlySet<string>;
}

/**
 * Which changes of the record take effect. One that was made after the train left does so only when another person
 * approved it. Exceptions: the *Undo* of the same hand, and taking a departure back, after which the train has not
 * left. Only an undo takes a decision back; else a later decision replaces it. Made when: by the account of the
 * person. Left when: by the departure that counts with its corrections, and for corrections of the departure itself
 * by the one that counts without them. The same answer for every order of arrival. `kept` is from `keepEntries`.
 */
export function approvalsIn(kept: readonly Entry[]): Approvals {
  const byId = new Map(kept.map((entry) => [entry.id, entry]));
  const withdrawals = ofKind(kept, 'withdrawn');
  const corrections = ofKind(kept, 'corrected');
  if (withdrawals.length + corrections.length === 0) return nothingChanged;
  const undos = withdrawals.filter((each) => isUndo(each, byId.get(each.target)));
  const undone = withdrawnIds(kept, undos);
  const decisions = decisionsIn(kept, byId, undone);
  const ofDeparture = departureChanges(byId, withdrawals, corrections);
  const exempt = new Set([...undos, ...withdrawals.filter((each) => ofDeparture.has(each.id))]);
  const leftRaw = departureIn(kept, [...exempt], []);
  const needed = new Set<string>();
  const requires = (change: RecordChange, left: Instant | null): void => {
    if (left !== null && change.observedAt > left) needed.add(change.id);
  };
  const isIdle = (id: string): boolean => needed.has(id) && decisions.get(id)?.isApproved !== true;
  const departureCorrections = corrections.filter((each) => ofDeparture.has(each.id) && !undone.has(each.id));
  for (const each of departureCorrections) requires(each, leftRaw);
  const effective = departureCorrections.filter((each) => !isIdle(each.id));
  const left = departureIn(kept, [...exempt], effective);
  for (const each of withdrawals) if (!exempt.has(each)) requires(each, left);
  for (const each of corrections) if (!ofDeparture.has(each.id)) requires(each, left);
  const idle = new Set([...needed].filter(isIdle));
  for (const each of withdrawals) {
    if (isDecision(byId.get(each.target)) && !undos.includes(each)) idle.add(each.id);
  }
  return { needed, decisions, idle };
}

const nothingChanged: Approvals = { needed: new Set(), decisions: new Map(), idle: new Set() };

/** Whether one more change of the record would wait for somebody's yes. */
export function wouldNeedApproval(entries: readonly Entry[], change: RecordChange): boolean {
  return approvalsIn([...entries, change]).needed.has(change.id);
}

function isDecision(entry: Entry | undefined): boolean {
  return entry?.kind === 'correction-approved' || entry?.kind === 'correction-declined';
}

function decisionsIn(
  kept: readonly Entry[],
  byId: ReadonlyMap<string, Entry>,
  undone: ReadonlySet<string>,
): Map<string, Decision> {
  const byTarget = new Map<string, DecisionEntry[]>();
  for (const each of [...ofKind(kept, 'correction-approved'), ...ofKind(kept, 'correction-declined')]) {
    const asker = byId.get(each.target)?.by?.personId;
    const isOwn = each.by === null || each.by.personId === asker;
    if (isOwn || undone.has(each.id)) continue;
    byTarget.set(each.target, [...(byTarget.get(each.target) ?? []), each]);
  }
  const decisions = new Map<string, Decision>();
  for (const [target, said] of byTarget) {
    const latest = latestObserved(said);
    if (latest !== null) decisions.set(target, decisionOf(latest));
  }
  return decisions;
}

type DecisionEntry = EntryOf<'correction-approved'> | EntryOf<'correction-declined'>;

function decisionOf(entry: DecisionEntry): Decision {
  return {
    entryId: entry.id,
    isApproved: entry.kind === 'correction-approved',
    at: entry.observedAt,
    by: entry.by,
    reason: entry.kind === 'correction-declined' ? entry.reason : null,
  };
}

/** Ids of the withdrawals and corrections whose chain of targets ends at a departure. */
function departureChanges(
  byId: ReadonlyMap<string, Entry>,
  withdrawals: readonly EntryOf<'withdrawn'>[],
  corrections: readonly EntryOf<'corrected'>[],
): Set<string> {
  const found = new Set<string>();
  for (const some of [withdrawals, corrections]) {
    const targets = new Map<string, string>(some.map((each) => [each.id, each.target]));
    for (const each of some) {
      if (byId.get(rootOf(each.target, targets))?.kind === 'departure') found.add(each.id);
    }
  }
  return found;
}

/** When the train left: by the account that counts once some changes are carried out; null when it has not. */
function departureIn(
  kept: readonly Entry[],
  withdrawals: readonly EntryOf<'withdrawn'>[],
  corrections: readonly EntryOf<'corrected'>[],
): Instant | null {
  const gone = withdrawnIds(kept, withdrawals);
  const targets = new Map(corrections.map((each) => [each.id, each.target]));
  const accounts = ofKind(kept, 'departure')
    .filter((entry) => !gone.has(entry.id))
    .map((entry) => {
      const own = corrections.filter(
        (each) => each.correctedObservedAt !== undefined && rootOf(each.target, targets) === entry.id,
      );
      const observedAt = latestObserved(own)?.correctedObservedAt ?? entry.observedAt;
      return accountOf({ ...entry, observedAt }, own.length > 0);
    });
  const rulings = ofKind(kept, 'ruled').filter((entry) => !gone.has(entry.id));
  return weighAccounts(accounts, rulings).accounts[0]?.at ?? null;
}
