import { useCallback, useRef, useState, type FocusEvent, type KeyboardEvent, type RefObject } from 'react';
import { usePreferences } from '../../../lib/preferences';
import { listCommand, movedIndex, type ListCommand, type TurnAct } from '../model/list-keys';

export interface TurnListOptions {
  /** Turns in the order of the list. */
  ids: readonly string[];
  /** Keys of the steps of a turn, in the order in which Left and Right walk them. */
  stepsOf: (turnId: string) => readonly string[];
  onAct: (act: TurnAct, turnId: string, step: string | null) => void;
  onWindow: (to: 'earlier' | 'later' | 'shorter' | 'longer' | 'now') => void;
}

/** A list of turns with one stop of the Tab key; arrows move inside it. */
export interface TurnList {
  /** The turn that has, or would get, the focus. */
  activeId: string | null;
  /** The step of that turn which has the focus; null when the row itself has it. */
  activeStep: string | null;
  container: RefObject<HTMLTableElement>;
  onKeyDown: (event: KeyboardEvent) => void;
  onFocus: (event: FocusEvent) => void;
  /** Puts the focus on a turn's row. */
  focusTurn: (turnId: string) => void;
}

const find = (root: HTMLElement | null, turnId: string, step: string | null): HTMLElement | null => {
  const turn = `[data-turn="${CSS.escape(turnId)}"]`;
  const place = step === null ? `${turn}:not([data-step])` : `${turn}[data-step="${CSS.escape(step)}"]`;
  return root?.querySelector<HTMLElement>(place) ?? null;
};

/** Roving focus over rows marked with `data-turn` and step cells marked with `data-turn` and `data-step`. */
export function useTurnList({ ids, stepsOf, onAct, onWindow }: TurnListOptions): TurnList {
  const container = useRef<HTMLTableElement>(null);
  const [chosen, setChosen] = useState<{ turn: string | null; step: string | null }>({
    turn: null,
    step: null,
  });
  const { letterKeys } = usePreferences();
  const activeId = chosen.turn !== null && ids.includes(chosen.turn) ? chosen.turn : (ids[0] ?? null);
  const activeStep = activeId === chosen.turn ? chosen.step : null;

  const focusPlace = useCallback((turn: string, step: string | null): void => {
    setChosen({ turn, step });
    const drawn = find(container.current, turn, step);
    if (drawn !== null) {
      drawn.focus();
      return;
    }
    // A step of the row heads is drawn only once it is chosen, so the focus follows in the next frame.
    requestAnimationFrame(() => {
      (find(container.current, turn, step) ?? find(container.current, turn, null))?.focus();
    });
  }, []);

  const run = (command: ListCommand, turn: string): void => {
    switch (command.do) {
      case 'move': {
        const next = ids[movedIndex(ids.indexOf(turn), command.by, ids.length)];
        if (next !== undefined)
          focusPlace(next, stepsOf(next).includes(activeStep ?? '') ? activeStep : null);
        break;
      }
      case 'step': {
        const steps = stepsOf(turn);
        const place = activeStep === null ? -1 : steps.indexOf(activeStep);
        const next = place + command.by;
        if (next < steps.length && next >= -1) focusPlace(turn, steps[next] ?? null);
        break;
      }
      case 'act':
        onAct(command.act, turn, activeStep);
        break;
      case 'window':
        onWindow(command.to);
        break;
    }
  };

  const onKeyDown = (event: KeyboardEvent): void => {
    const target = event.target as HTMLElement;
    const turn = target.closest<HTMLElement>('[data-turn]')?.dataset['turn'];
    const command = listCommand(event, letterKeys);
    if (turn === undefined || command === null || target.closest('a, button, input, select') !== null) return;
    event.preventDefault();
    run(command, turn);
  };

  const onFocus = (event: FocusEvent): void => {
    const place = (event.target as HTMLElement).closest<HTMLElement>('[data-turn]');
    const turn = place?.dataset['turn'];
    if (turn !== undefined) setChosen({ turn, step: place?.dataset['step'] ?? null });
  };

  const focusTurn = useCallback((turn: string) => focusPlace(turn, null), [focusPlace]);
  return { activeId, activeStep, container, onKeyDown, onFocus, focusTurn };
}
