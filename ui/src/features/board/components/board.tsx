import { Button } from '@blueprintjs/core';
import type { WireTerminal } from '@stubpost/shared';
import { useCallback, useEffect, useMemo, useRef, useState } from 'react';
import { Link } from 'react-router-dom';
import { EmptyState, ErrorState, LoadingRows } from '../../../components/page-states';
import { PartBoundary } from '../../../components/part-boundary';
import { useLiveState } from '../../../lib/live';
import { useMay } from '../../../lib/session';
import { formatServiceDate } from '../../../lib/time-display';
import { useNow } from '../../../lib/use-now';
import { useReturnFocus } from '../../../lib/use-return-focus';
import { noFilter } from '../model/board-search';
import type { TurnNow } from '../../../lib/turn/turn-now';
import { isFiltering } from '../model/filter-turns';
import type { TurnAct, WindowMove } from '../model/list-keys';
import { rowWords } from '../model/row-words';
import { clockText, timeText } from '../../../lib/turn/time-text';
import { movedChoice, neighbourSpan, resizedChoice, type TimeWindow } from '../model/time-window';
import { BoardTools } from './board-tools';
import type { BoardPartProps } from './board-part';
import styles from './board.module.css';
import { ExtraTurnDialog } from './extra-turn-dialog';
import { Legend } from './legend';
import type { Pace } from './pace-menu';
import { TableView } from './table-view';
import { TimelineView } from './timeline-view';
import { useBoardView } from './use-board-view';
import { useShownTurns } from './use-shown-turns';

export interface BoardProps {
  terminal: WireTerminal;
  /** The turn whose panel is open; it is marked, and gets the focus back when the panel closes. */
  openId: string | null;
  /** Narrow screens have the table only. */
  hasPicture: boolean;
  onOpen: (turnId: string) => void;
  /** Everything else that a key asks for. */
  onAct: (act: Exclude<TurnAct, 'open'>, turn: TurnNow, step: string | null) => void;
}

const staleAfter = 60_000;

/** The live board of a terminal: one view model, shown as a picture with row heads or as a table. */
export function Board({ terminal, openId, hasPicture, onOpen, onAct }: BoardProps) {
  const [asked, change] = useBoardView();
  const view = hasPicture ? asked : { ...asked, view: 'table' as const, by: 'departure' as const };
  const [pace, setPace] = useState<Pace>(1);
  const [pausedAt, setPausedAt] = useState<number | null>(null);
  const [hasLegend, setLegend] = useState(true);
  const [isAdding, setAdding] = useState(false);
  const focus = useReturnFocus();
  const ticking = useNow(pace);
  const now = pausedAt ?? ticking;
  const holdKey = pausedAt !== null || pace > 1 ? String(now) : undefined;
  const found = useShownTurns({ terminal, view, now, holdKey });
  const { window: shownWindow, shown } = found;
  const isStale = useStale(ticking);
  const wordsOf = useMemo(() => new Map(shown.map((turn) => [turn.id, rowWords(turn, now)])), [shown, now]);

  const setWindow = (to: WindowMove): void => {
    if (to === 'now') change({ startAt: null });
    else if (to === 'earlier' || to === 'later')
      change(movedChoice(view, shownWindow, to === 'earlier' ? -1 : 1));
    else change(resizedChoice(view, shownWindow, neighbourSpan(view.span, to === 'shorter' ? -1 : 1)));
  };
  const act = useStableCallback((what: TurnAct, turnId: string, step: string | null) => {
    const turn = found.all.get(turnId);
    if (what === 'open') onOpen(turnId);
    else if (turn !== undefined) onAct(what, turn, step);
  });

  const parts = { terminal, view, now, found, wordsOf, openId, onAct: act, onWindow: setWindow };
  return (
    <div className={`${styles.board} ${isStale ? `stale ${styles.stale}` : ''}`}>
      <BoardTools
        view={view}
        windowWords={`${windowWords(shownWindow, terminal.zone)}, `}
        countWords={`${shown.length} of ${found.total} turns`}
        hasPicture={hasPicture}
        hasLegend={hasLegend}
        pace={pace}
        pausedAt={pausedAt === null ? null : clockText(pausedAt, terminal.zone)}
        isHalf={openId !== null}
        mayAdd={useMay('turns.create', terminal.code)}
        onView={(next) => change({ view: next, by: next === 'table' ? 'departure' : 'track' })}
        onGrouping={(by) => change({ by })}
        onSpan={(span) => change(resizedChoice(view, shownWindow, span))}
        onMove={(direction) => setWindow(direction === -1 ? 'earlier' : 'later')}
        onNow={() => setWindow('now')}
        onFilter={(filter) => change({ filter })}
        onLegend={() => setLegend(!hasLegend)}
        onPace={(next) => {
          setPace(next);
          setPausedAt(null);
        }}
        onPause={() => setPausedAt(pausedAt === null ? now : null)}
        onAdd={() => {
          focus.remember();
          setAdding(true);
        }}
      />
      {found.steady.waiting > 0 && (
        <div className={styles.waiting}>
          <Button size="small" onClick={found.steady.letIn}>
            {found.steady.waiting === 1 ? '1 change waits' : `${found.steady.waiting} changes wait`}: show
          </Button>
        </div>
      )}
      <BoardState {...parts} onClear={() => change({ filter: noFilter })}>
        <PartBoundary part="This picture" rest="The other pages are fine.">
          {view.view === 'table' ? (
            <TableView {...parts} />
          ) : (
            <TimelineView {...parts} onDrag={(choice) => change(choice)} />
          )}
        </PartBoundary>
      </BoardState>
      {view.view === 'timeline' && hasLegend && <Legend isHalf={openId !== null} />}
      <ExtraTurnDialog
        terminal={terminal}
        isOpen={isAdding}
        onClose={() => {
          setAdding(false);
          focus.giveBack();
        }}
        onDone={(turn) => {
          setAdding(false);
          onOpen(turn.id);
        }}
      />
    </div>
  );
}

function windowWords({ from, to }: TimeWindow, zone: string): string {
  return `${timeText(wholeMinute(from), zone)} to ${timeText(wholeMinute(to), zone)}`;
}

const wholeMinute = (instant: number): number => Math.floor(instant / 60_000) * 60_000;

/** Whether the server has been silent for so long that nothing on the board may claim to be now. */
function useStale(now: number): boolean {
  const { live, lastWordAt } = useLiveState();
  return !live && lastWordAt !== null && now - lastWordAt > staleAfter;
}

/** A callback that stays the same object, so that rows need not be drawn again, and always does the latest. */
function useStableCallback<Args extends unknown[]>(
  callback: (...args: Args) => void,
): (...args: Args) => void {
  const latest = useRef(callback);
  useEffect(() => {
    latest.current = callback;
  });
  return useCallback((...args: Args) => latest.current(...args), []);
}

/** Loading, failed, empty or hidden by the filter, in words; else the board itself. */
function BoardState(props: BoardPartProps & { onClear: () => void; children: JSX.Element }) {
  const { found, view, terminal } = props;
  const mayImport = useMay('timetables.import', terminal.code);
  const day = formatServiceDate(found.date);
  if (found.error !== null) return <ErrorState error={found.error} onRetry={found.retry} />;
  if (found.isPending) {
    return (
      <LoadingRows
        what={`turns for ${day}`}
        rows={8}
        rowHeight={view.view === 'table' ? 41 : 72}
        onRetry={found.retry}
      />
    );
  }
  if (found.total === 0 && found.inWindow === 0) {
    return (
      <EmptyState words={`No turns planned at this terminal for ${day}.`}>
        {mayImport && <Link to="/timetables">Import timetable</Link>}
      </EmptyState>
    );
  }
  if (found.shown.length === 0 && isFiltering(view.filter)) {
    return (
      <EmptyState words={`0 of ${found.total} turns match.`}>
        <Button onClick={props.onClear}>Clear filter</Button>
      </EmptyState>
    );
  }
  if (found.shown.length === 0 && view.view === 'table') {
    return <EmptyState words={`No turns from ${windowWords(found.window, terminal.zone)}.`} />;
  }
  return props.children;
}
