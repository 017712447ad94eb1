import { useCallback, useRef } from 'react';

/**
 * Gives the focus back to what opened a dialog. The dialog's own fields take the focus before the component library
 * could note who had it, so it is noted in the handler that opens.
 */
export function useReturnFocus(): { remember: () => void; giveBack: () => void } {
  const opener = useRef<HTMLElement | null>(null);
  const remember = useCallback((): void => {
    opener.current = document.activeElement instanceof HTMLElement ? document.activeElement : null;
  }, []);
  const giveBack = useCallback((): void => {
    const element = opener.current;
    opener.current = null;
    if (element === null) return;
    // Once the dialog is gone. A row may have been drawn anew meanwhile: then the row of the same turn.
    setTimeout(() => (element.isConnected ? element : sameTurn(element))?.focus(), 0);
  }, []);
  return { remember, giveBack };
}

function sameTurn(element: HTMLElement): HTMLElement | null {
  const turn = element.dataset['turn'];
  return turn === undefined
    ? null
    : document.querySelector<HTMLElement>(`tr[data-turn="${CSS.escape(turn)}"]`);
}
