import type { Anchor } from '@stubpost/shared';
import type { TurnNow } from '../../../lib/turn/turn-now';

/** A column of the table for one step of the plan. */
export interface StepColumn {
  key: string;
  shortLabel: string;
  anchor: Anchor;
}

/**
 * The step columns: every step that holds a departure on any of the turns, those from the arrival first, in the order in
 * which the plans have them. A step that only an unusual plan has comes after the ones it follows there.
 */
export function stepColumns(turns: readonly TurnNow[]): StepColumn[] {
  const columns: StepColumn[] = [];
  for (const turn of turns) {
    let place = 0;
    for (const { key, shortLabel, anchor, holdsDeparture } of turn.steps) {
      const known = columns.findIndex((column) => column.key === key);
      if (known >= 0) place = known + 1;
      else if (holdsDeparture) columns.splice(place++, 0, { key, shortLabel, anchor });
    }
  }
  const side = (anchor: Anchor): StepColumn[] => columns.filter((column) => column.anchor === anchor);
  return [...side('arrival'), ...side('departure')];
}
