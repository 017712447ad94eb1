import { Button, ButtonGroup, Popover, SegmentedControl } from '@blueprintjs/core';
import {
  groupingsOf,
  type BoardView,
  type Grouping,
  type TurnFilter,
  type View,
} from '../model/board-search';
import { filterSaid, isFiltering } from '../model/filter-turns';
import { SPANS, type Span } from '../model/time-window';
import styles from './board-tools.module.css';
import { FilterForm } from './filter-form';
import { PaceMenu, type Pace } from './pace-menu';

export interface BoardToolsProps {
  view: BoardView;
  /** "17:06 to 19:06, ". */
  windowWords: string;
  /** "15 of 143 turns". */
  countWords: string;
  /** Narrow screens have the table only. */
  hasPicture: boolean;
  hasLegend: boolean;
  pace: Pace;
  pausedAt: string | null;
  mayAdd: boolean;
  isHalf: boolean;
  onView: (view: View) => void;
  onGrouping: (by: Grouping) => void;
  onSpan: (span: Span) => void;
  onMove: (direction: -1 | 1) => void;
  onNow: () => void;
  onFilter: (filter: TurnFilter) => void;
  onLegend: () => void;
  onPace: (pace: Pace) => void;
  onPause: () => void;
  onAdd: () => void;
}

const groupingWords: Record<Grouping, string> = {
  departure: 'By departure',
  track: 'By track',
  set: 'By set',
};

const spanWords = (span: Span): string => (span === 'day' ? 'Day' : `${span / 60} h`);

/** How the board is shown: as what, in which rows, how long, which turns, and whether it moves. */
export function BoardTools(props: BoardToolsProps) {
  const { view } = props;
  return (
    <div
      className={`${styles.tools} ${props.isHalf ? styles.half : ''}`}
      role="group"
      aria-label="View of the board"
    >
      {props.hasPicture && (
        <SegmentedControl
          aria-label="Show as"
          value={view.view}
          onValueChange={(value) => props.onView(value as View)}
          options={[
            { label: 'Timeline', value: 'timeline' },
            { label: 'Table', value: 'table' },
          ]}
        />
      )}
      <SegmentedControl
        aria-label="Rows"
        value={view.by}
        onValueChange={(value) => props.onGrouping(value as Grouping)}
        options={groupingsOf(view.view).map((by) => ({ label: groupingWords[by], value: by }))}
      />
      <ButtonGroup aria-label="Move">
        <Button onClick={() => props.onMove(-1)}>Earlier</Button>
        <Button aria-pressed={view.startAt === null} onClick={props.onNow}>
          Now
        </Button>
        <Button onClick={() => props.onMove(1)}>Later</Button>
      </ButtonGroup>
      <SegmentedControl
        aria-label="Length shown"
        value={String(view.span)}
        onValueChange={(value) => props.onSpan(value === 'day' ? 'day' : Number(value))}
        options={SPANS.map((span) => ({ label: spanWords(span), value: String(span) }))}
      />
      <span className={styles.shown}>
        <span className={styles.window}>{props.windowWords}</span>
        {props.countWords}
      </span>
      <div className={styles.right}>
        {props.mayAdd && <Button onClick={props.onAdd}>Extra turn</Button>}
        {view.view === 'timeline' && (
          <Button aria-expanded={props.hasLegend} aria-pressed={props.hasLegend} onClick={props.onLegend}>
            Legend
          </Button>
        )}
        <Popover
          placement="bottom-end"
          minimal
          content={<FilterForm filter={view.filter} onFilter={props.onFilter} />}
          renderTarget={({ isOpen, ref, ...target }) => (
            <Button {...target} ref={ref} aria-expanded={isOpen} aria-pressed={isFiltering(view.filter)}>
              {filterSaid(view.filter)}
            </Button>
          )}
        />
        <PaceMenu pace={props.pace} pausedAt={props.pausedAt} onPace={props.onPace} onPause={props.onPause} />
      </div>
    </div>
  );
}
