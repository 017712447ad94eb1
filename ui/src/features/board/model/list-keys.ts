/** What can be done to a turn from the lists. */
export const TURN_ACTS = ['open', 'tick', 'relay', 'note', 'take', 'set-aside', 'track', 'set'] as const;
export type TurnAct = (typeof TURN_ACTS)[number];

/** How a key moves or resizes the window. */
export type WindowMove = 'earlier' | 'later' | 'shorter' | 'longer' | 'now';

/** What a key does while a list of turns has the focus. */
export type ListCommand =
  | { do: 'move'; by: number | 'first' | 'last' }
  | { do: 'step'; by: -1 | 1 }
  | { do: 'act'; act: TurnAct }
  | { do: 'window'; to: WindowMove };

const pageRows = 10;

/** Keys that always work. */
const standing: Record<string, ListCommand> = {
  ArrowUp: { do: 'move', by: -1 },
  ArrowDown: { do: 'move', by: 1 },
  PageUp: { do: 'move', by: -pageRows },
  PageDown: { do: 'move', by: pageRows },
  Home: { do: 'move', by: 'first' },
  End: { do: 'move', by: 'last' },
  ArrowLeft: { do: 'step', by: -1 },
  ArrowRight: { do: 'step', by: 1 },
  Enter: { do: 'act', act: 'open' },
  ' ': { do: 'act', act: 'tick' },
};

/** Single characters, which a person may switch off. */
const single: Record<string, ListCommand> = {
  r: { do: 'act', act: 'relay' },
  n: { do: 'act', act: 'note' },
  t: { do: 'act', act: 'take' },
  s: { do: 'act', act: 'set-aside' },
  m: { do: 'act', act: 'track' },
  w: { do: 'act', act: 'set' },
  '[': { do: 'window', to: 'earlier' },
  ']': { do: 'window', to: 'later' },
  '+': { do: 'window', to: 'shorter' },
  '=': { do: 'window', to: 'shorter' },
  '-': { do: 'window', to: 'longer' },
  '0': { do: 'window', to: 'now' },
};

export interface KeyPress {
  key: string;
  ctrlKey: boolean;
  altKey: boolean;
  metaKey: boolean;
}

/** The command of a key, or null: with Ctrl, Alt or the system key the browser keeps it. */
export function listCommand(press: KeyPress, hasLetterKeys: boolean): ListCommand | null {
  if (press.ctrlKey || press.altKey || press.metaKey) return null;
  const always = standing[press.key];
  if (always !== undefined) return always;
  return hasLetterKeys ? (single[press.key.toLowerCase()] ?? null) : null;
}

/** The place in a list after a move, held within it. */
export function movedIndex(index: number, by: number | 'first' | 'last', length: number): number {
  if (by === 'first') return 0;
  if (by === 'last') return length - 1;
  return Math.min(length - 1, Math.max(0, index + by));
}
