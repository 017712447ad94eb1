import { useEffect, useRef } from 'react';

const FIELDS = 'input, textarea, select, [contenteditable="true"]';

/** Whether keys that are pressed now are meant for a field. */
export function isTyping(target: EventTarget | null): boolean {
  return target instanceof Element && target.closest(FIELDS) !== null;
}

/** A key that works on the whole page. */
export interface PageKey {
  /** As `KeyboardEvent.key` names it, small letters: `k`, `?`. */
  key: string;
  /** With Ctrl (or Cmd): works in fields too. Without, the key is dead while somebody types. */
  withControl?: boolean;
  isOff?: boolean;
}

/** Calls `act` when the key is pressed anywhere on the page. */
export function usePageKey({ key, withControl = false, isOff = false }: PageKey, act: () => void): void {
  const latest = useRef(act);
  useEffect(() => {
    latest.current = act;
  });
  useEffect(() => {
    if (isOff) return undefined;
    const onKeyDown = (event: KeyboardEvent): void => {
      const hasControl = event.ctrlKey || event.metaKey;
      if (event.key.toLowerCase() !== key || hasControl !== withControl || event.altKey) return;
      if (event.defaultPrevented || (!withControl && isTyping(event.target))) return;
      event.preventDefault();
      latest.current();
    };
    document.addEventListener('keydown', onKeyDown);
    return () => document.removeEventListener('keydown', onKeyDown);
  }, [key, withControl, isOff]);
}
