import { useCallback, useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';
import { formatBoardView, parseBoardView, type BoardView } from '../model/board-search';

const ours = ['view', 'by', 'span', 'at', 'q', 'state', 'needs'];

/** The view of the board as the address has it, and how to change it. Other parts of the address stay. */
export function useBoardView(): [BoardView, (change: Partial<BoardView>) => void] {
  const [query, setQuery] = useSearchParams();
  const text = query.toString();
  const view = useMemo(() => parseBoardView(new URLSearchParams(text)), [text]);
  const change = useCallback(
    (part: Partial<BoardView>): void => {
      setQuery(
        (before) => {
          const next = formatBoardView({ ...parseBoardView(before), ...part });
          for (const [name, value] of before) if (!ours.includes(name)) next.set(name, value);
          return next;
        },
        { replace: true },
      );
    },
    [setQuery],
  );
  return [view, change];
}
