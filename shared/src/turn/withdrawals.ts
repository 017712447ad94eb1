import type { Entry } from './entry';

type Withdrawal = Extract<Entry, { kind: 'withdrawn' }>;

/**
 * The ids among `entries` that some withdrawals take back. A withdrawal may itself be withdrawn; then its target
 * stands again. In a circle of withdrawals the first of the list decides, so give `entries` in their kept order.
 */
export function withdrawnIds(entries: readonly Entry[], withdrawals: readonly Withdrawal[]): Set<string> {
  const answers = new Map<string, boolean>();
  const path = new Set<string>();
  const isWithdrawn = (id: string): boolean => {
    const known = answers.get(id);
    if (known !== undefined) return known;
    if (path.has(id)) return false;
    path.add(id);
    const answer = withdrawals.some((each) => each.target === id && !isWithdrawn(each.id));
    path.delete(id);
    answers.set(id, answer);
    return answer;
  };
  return new Set(entries.map((entry) => entry.id).filter((id) => isWithdrawn(id)));
}

/** Follows a chain of targets to the entry at its end; a circle ends where it began. */
export function rootOf(target: string, targets: ReadonlyMap<string, string>): string {
  const seen = new Set<string>();
  let root = target;
  for (let next = targets.get(root); next !== undefined && !seen.has(root); next = targets.get(root)) {
    seen.add(root);
    root = next;
  }
  return root;
}
