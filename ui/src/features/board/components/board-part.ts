import type { WireTerminal } from '@stubpost/shared';
import type { BoardView } from '../model/board-search';
import type { TurnAct, WindowMove } from '../model/list-keys';
import type { ShownTurns } from './use-shown-turns';

/** What both views of the board are drawn from. */
export interface BoardPartProps {
  terminal: WireTerminal;
  view: BoardView;
  now: number;
  found: ShownTurns;
  wordsOf: ReadonlyMap<string, string>;
  /** Moves or resizes the window, as a key of the list asks. */
  onWindow: (to: WindowMove) => void;
  openId: string | null;
  onAct: (act: TurnAct, turnId: string, step: string | null) => void;
}
