import { useRef, useState, type FocusEvent } from 'react';
import { heldIds, type SteadyIds } from '../model/steady-ids';

export interface Steady extends SteadyIds {
  /** Lets what waits come in now. */
  letIn: () => void;
  /** For the element that holds the list: pointer over it or focus in it hold the list. */
  hold: {
    onPointerEnter: () => void;
    onPointerLeave: () => void;
    onFocus: () => void;
    onBlur: (event: FocusEvent) => void;
  };
}

/** Keeps the turns of a list in place while the pointer or the focus is on it. A new question (`key`) lets go. */
export function useSteadyIds(wanted: readonly string[], key: string): Steady {
  const [isPointed, setPointed] = useState(false);
  const [isFocused, setFocused] = useState(false);
  const [, redraw] = useState(0);
  const shown = useRef({ ids: wanted, key });
  const isHeld = (isPointed || isFocused) && shown.current.key === key && shown.current.ids.length > 0;
  if (!isHeld) shown.current = { ids: wanted, key };
  return {
    ...heldIds(shown.current.ids, wanted),
    letIn: () => {
      shown.current = { ids: wanted, key };
      redraw((count) => count + 1);
    },
    hold: {
      onPointerEnter: () => setPointed(true),
      onPointerLeave: () => setPointed(false),
      onFocus: () => setFocused(true),
      onBlur: (event) => setFocused(event.currentTarget.contains(event.relatedTarget)),
    },
  };
}
