/** How an entry is changed: taken back before the departure, corrected with a supervisor's yes after it. */
export type ChangeAct = 'withdrawn' | 'corrected';

/** What is said about other entries is answered by saying it anew, and is not itself taken back from the log. */
const settledKinds: readonly string[] = [
  'withdrawn',
  'corrected',
  'correction-approved',
  'correction-declined',
  'agreed',
  'disagreed',
  'ruled',
];

/** Whether an entry of this kind is never taken back from the log. */
export function isSettled(kind: string): boolean {
  return settledKinds.includes(kind);
}
