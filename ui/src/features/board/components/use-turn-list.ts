import {
  useCallback,
  useEffect,
  useRef,
  useState,
  type FocusEvent,
  type KeyboardEvent,
  type RefObject,
} from 'react';
import { usePreferences } from '../../../lib/preferences';
import { listCommand, movedIndex, type ListCommand, type TurnAct, type WindowMove } from '../model/list-keys';

export interface TurnListOptions {
  /** Turns that have a row, in the order in which the rows stand. */
  ids: readonly string[];
  /** Keys of the steps of a turn, in the order in which Left and Right walk them. */
  stepsOf: (turnId: string) => readonly string[];
  onAct: (act: TurnAct, turnId: string, step: string | null) => void;
  onWindow: (to: WindowMove) => void;
  /** The turn whose panel is open; when it closes its row gets the focus back. */
  openId: string | null;
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
  onBlur: (event: FocusEvent) => void;
}

const find = (root: HTMLElement | null, turnId: string, step: string | null): HTMLElement | null => {
  const turn = `[data-turn="${CSS.escape(turnId)}"]`;
  const place = step === null ? `${turn}:not([data-step])` : `${turn}[data-step="${CSS.escape(step)}"]`;
  return root?.querySelector<HTMLElement>(place) ?? null;
};

/** Roving focus over rows marked with `data-turn` and step cells marked with `data-turn` and `data-step`. */
export function useTurnList({ ids, stepsOf, onAct, onWindow, openId }: TurnListOptions): TurnList {
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

  useFocusBack(openId, focusPlace);
  const hold = useFocusHold(activeId, focusPlace);
  return {
    activeId,
    activeStep,
    container,
    onKeyDown,
    onFocus: (event) => {
      hold.onFocus();
      onFocus(event);
    },
    onBlur: hold.onBlur,
  };
}

type FocusPlace = (turn: string, step: string | null) => void;

/** When the panel closes the focus goes back to the turn it was open for. */
function useFocusBack(openId: string | null, focusPlace: FocusPlace): void {
  const before = useRef(openId);
  useEffect(() => {
    if (before.current !== null && openId === null) focusPlace(before.current, null);
    before.current = openId;
  }, [openId, focusPlace]);
}

/** A row that leaves the list takes the focus with it; then the row that has the tab stop gets it. */
function useFocusHold(activeId: string | null, focusPlace: FocusPlace) {
  const hasFocus = useRef(false);
  useEffect(() => {
    if (hasFocus.current && activeId !== null && document.activeElement === document.body) {
      focusPlace(activeId, null);
    }
  }, [activeId, focusPlace]);
  return {
    onFocus: (): void => {
      hasFocus.current = true;
    },
    onBlur: (event: FocusEvent): void => {
      // An element that is taken out of the page may blur as well, but then it is no longer in it.
      hasFocus.current = !(event.target as HTMLElement).isConnected;
    },
  };
}
