import { replaceEqualDeep } from '@tanstack/react-query';
import { useRef } from 'react';
import { usePerson } from '../../../lib/session';
import { formatServiceDate, formatZoneLetters } from '../../../lib/time-display';
import { clashPartners, groupRows } from '../model/group-rows';
import { stepColumns, type StepColumn } from '../model/step-columns';
import type { TurnNow } from '../../../lib/turn/turn-now';
import { useTurnList } from './use-turn-list';
import { tableRow } from '../model/table-cells';
import { timeText } from '../../../lib/turn/time-text';
import type { BoardPartProps } from './board-part';
import styles from './board.module.css';
import { TurnTable, type TableGroup } from './turn-table';

const orderWords = { departure: 'in order of departure', track: 'by track', set: 'by set' } as const;

/** The board as a table. */
export function TableView(props: BoardPartProps) {
  const { terminal, view, now, found, wordsOf, openId, onAct, onWindow } = props;
  const me = usePerson().name;
  const columns = useKept(stepColumns(found.shown));
  const trackRows = groupRows(found.shown, 'track', terminal.tracks, now);
  const partners = clashPartners(trackRows);
  const trainOf = (id: string): string => found.all.get(id)?.train ?? '';
  const rowOf = (turn: (typeof found.shown)[number]) =>
    tableRow(turn, {
      now,
      tracks: terminal.tracks,
      stepKeys: columns.map((column) => column.key),
      me,
      clashesWith: [...(partners.get(turn.id) ?? [])].map(trainOf),
    });
  const groups: TableGroup[] =
    view.by === 'departure'
      ? [{ id: 'all', label: null, rows: found.shown.map(rowOf) }]
      : mergedGroups(view.by === 'track' ? trackRows : groupRows(found.shown, 'set', [], now)).map(
          (group) => ({
            ...group,
            rows: group.turns.map(rowOf),
          }),
        );
  const list = useTurnList({
    ids: groups.flatMap((group) => group.rows.map((row) => row.id)),
    stepsOf: (turnId) => stepsIn(turnId, columns, found.all),
    onAct,
    onWindow,
    openId,
  });
  const { zone } = terminal;
  const caption =
    `${found.shown.length} turns, ${terminal.name}, ${formatServiceDate(found.date)}, ` +
    `${timeText(found.window.from, zone)} to ${timeText(found.window.to, zone)} ${formatZoneLetters(now, zone)}, ${orderWords[view.by]}`;
  return (
    <div className={styles.tableArea} {...found.steady.hold}>
      <TurnTable
        caption={caption}
        groups={useKept(groups)}
        columns={columns}
        wordsOf={wordsOf}
        list={list}
        openId={openId}
        onAct={onAct}
        byDeparture={view.by === 'departure'}
      />
      <p className={styles.foot}>
        Terminal time, {formatZoneLetters(now, zone)}. ~ forecast at typical pace. Filled mark: recorded;
        half: by radio or entered later. Stubpost shows what is recorded and what the rule asks for; the
        railroad’s rules, the law and qualified people decide.
      </p>
    </div>
  );
}

/** Steps of a turn that have a cell in the table. */
function stepsIn(
  turnId: string,
  columns: readonly StepColumn[],
  all: ReadonlyMap<string, TurnNow>,
): string[] {
  const steps = all.get(turnId)?.steps ?? [];
  return columns
    .filter((column) => steps.some((step) => step.key === column.key))
    .map((column) => column.key);
}

/** Groups of the table: all turns of a track or set together, also where the picture needs several rows for them. */
function mergedGroups(rows: ReturnType<typeof groupRows>) {
  const groups = new Map<
    string | null,
    { id: string; label: string; turns: (typeof rows)[number]['turns'] }
  >();
  for (const row of rows) {
    const noun = row.subject === 'track' ? 'Track' : 'Set';
    const label = row.label === null ? `No ${noun.toLowerCase()} yet` : `${noun} ${row.label}`;
    const group = groups.get(row.label) ?? { id: row.id, label, turns: [] };
    groups.set(row.label, { ...group, turns: [...group.turns, ...row.turns] });
  }
  return [...groups.values()].filter((group) => group.turns.length > 0);
}

/** The same object as before where nothing changed, so that unchanged rows are not drawn again. */
function useKept<Value>(value: Value): Value {
  const kept = useRef(value);
  kept.current = replaceEqualDeep(kept.current, value);
  return kept.current;
}
