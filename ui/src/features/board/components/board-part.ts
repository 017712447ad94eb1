import type { WireTerminal } from '@stubpost/shared';
import type { BoardView } from '../model/board-search';
import type { TurnAct } from '../model/list-keys';
import type { ShownTurns } from './use-shown-turns';
import type { TurnList } from './use-turn-list';

/** What both views of the board are drawn from. */
export interface BoardPartProps {
  terminal: WireTerminal;
  view: BoardView;
  now: number;
  found: ShownTurns;
  wordsOf: ReadonlyMap<string, string>;
  list: TurnList;
  openId: string | null;
  onAct: (act: TurnAct, turnId: string, step: string | null) => void;
}
