import { memo } from 'react';
import type { StepColumn } from '../model/step-columns';
import type { TableRow } from '../model/table-cells';
import type { TurnAct } from '../model/list-keys';
import { FlagCell, StepTableCell, TwoLines } from './table-parts';
import styles from './turn-table.module.css';
import type { TurnList } from './use-turn-list';

/** Rows that stand together under one heading; without a label they need none. */
export interface TableGroup {
  id: string;
  label: string | null;
  rows: readonly TableRow[];
}

export interface TurnTableProps {
  caption: string;
  groups: readonly TableGroup[];
  columns: readonly StepColumn[];
  /** What is read out for each turn's row. */
  wordsOf: ReadonlyMap<string, string>;
  list: TurnList;
  openId: string | null;
  onAct: (act: TurnAct, turnId: string, step: string | null) => void;
  /** Whether the rows are in order of departure, for the sign in the heading. */
  byDeparture: boolean;
}

const fixedColumns = [44, 58, 82, 128, 46, 98, 50, 50, 86];
const stepWidth = 86;
const endColumns = [82, 98];

/** Every fact of the picture as a table: one row a turn, two lines a row, one stop of the Tab key, arrows inside. */
export function TurnTable(props: TurnTableProps) {
  const { caption, groups, columns, list } = props;
  const width = [...fixedColumns, ...endColumns, ...columns.map(() => stepWidth)].reduce((a, b) => a + b, 0);
  const columnCount = fixedColumns.length + columns.length + endColumns.length;
  return (
    <div className={styles.scroll}>
      <table
        role="grid"
        className={styles.turns}
        style={{ minWidth: width }}
        ref={list.container}
        onKeyDown={list.onKeyDown}
        onFocus={list.onFocus}
        onBlur={list.onBlur}
      >
        <caption className="unseen">{caption}</caption>
        <colgroup>
          {[...fixedColumns, ...columns.map(() => stepWidth), ...endColumns].map((column, index) => (
            <col key={index} style={{ width: column }} />
          ))}
        </colgroup>
        <TableHead columns={columns} byDeparture={props.byDeparture} />
        {groups.map((group) => (
          <tbody key={group.id}>
            {group.label !== null && (
              <tr className={styles.groupRow}>
                <th colSpan={columnCount} scope="rowgroup">
                  {group.label}
                </th>
              </tr>
            )}
            {group.rows.map((row) => (
              <TurnRow
                key={row.id}
                row={row}
                columns={columns}
                words={props.wordsOf.get(row.id) ?? ''}
                isActive={list.activeId === row.id}
                activeStep={list.activeId === row.id ? list.activeStep : null}
                isOpen={props.openId === row.id}
                onAct={props.onAct}
              />
            ))}
          </tbody>
        ))}
      </table>
    </div>
  );
}

function TableHead({ columns, byDeparture }: { columns: readonly StepColumn[]; byDeparture: boolean }) {
  const arrival = columns.filter((column) => column.anchor === 'arrival').length;
  const departure = columns.length - arrival;
  return (
    <thead>
      <tr className={styles.sides}>
        <td colSpan={5} />
        <td colSpan={3} className={styles.edge} />
        <td className={styles.edge} />
        {arrival > 0 && (
          <th colSpan={arrival} scope="colgroup" className={styles.edge}>
            Due from the arrival
          </th>
        )}
        {departure > 0 && (
          <th colSpan={departure} scope="colgroup" className={styles.edge}>
            Due from the departure
          </th>
        )}
        <th scope="colgroup" className={styles.edge}>
          Forecast
        </th>
        <td className={styles.edge} />
      </tr>
      <tr>
        <th scope="col" className={styles.trackHead}>
          Track
        </th>
        <th scope="col">Train</th>
        <th scope="col" {...(byDeparture ? { 'aria-sort': 'ascending' as const } : {})}>
          Leaves
        </th>
        <th scope="col">Plan</th>
        <th scope="col" className={styles.number}>
          Spare
        </th>
        <th scope="col" className={styles.edge}>
          State
        </th>
        <th scope="col" className={styles.number}>
          Set
        </th>
        <th scope="col" className={styles.number}>
          Marker
        </th>
        <th scope="col" className={styles.edge}>
          Arrived
        </th>
        {columns.map((column, index) => (
          <th
            key={column.key}
            scope="col"
            className={index === 0 || index === arrival ? styles.edge : undefined}
          >
            {column.shortLabel}
          </th>
        ))}
        <th scope="col" className={styles.edge}>
          Ready
        </th>
        <th scope="col" className={styles.edge}>
          Conductor
        </th>
      </tr>
    </thead>
  );
}

interface TurnRowProps {
  row: TableRow;
  columns: readonly StepColumn[];
  words: string;
  isActive: boolean;
  activeStep: string | null;
  isOpen: boolean;
  onAct: TurnTableProps['onAct'];
}

const TurnRow = memo(function TurnRow({
  row,
  columns,
  words,
  isActive,
  activeStep,
  isOpen,
  onAct,
}: TurnRowProps) {
  const looks = [
    styles[row.look],
    row.untaken && styles.untaken,
    row.blueSignal && styles.blue,
    isOpen && styles.picked,
  ];
  const arrival = columns.filter((column) => column.anchor === 'arrival').length;
  return (
    <tr
      className={looks.filter(Boolean).join(' ')}
      data-turn={row.id}
      tabIndex={isActive && activeStep === null ? 0 : -1}
      aria-label={words}
      aria-selected={isOpen}
      onClick={() => onAct('open', row.id, null)}
    >
      <td className={styles.track}>{row.track}</td>
      <th scope="row" className={styles.train}>
        <TwoLines cell={row.train} />
      </th>
      <td className={styles.leaves}>
        <TwoLines cell={row.leaves} />
      </td>
      <td>
        <FlagCell cell={row.plan} />
      </td>
      <td className={styles.spare}>{row.spare}</td>
      <td className={styles.edge}>
        <TwoLines cell={row.state} />
      </td>
      <td className={styles.number}>
        <TwoLines cell={row.set} />
      </td>
      <td className={styles.number}>
        <TwoLines cell={row.marker} />
      </td>
      <td className={styles.edge}>
        <TwoLines cell={row.arrived} />
      </td>
      {row.steps.map((cell, index) => {
        const key = columns[index]?.key ?? String(index);
        return (
          <StepTableCell
            key={key}
            turnId={row.id}
            stepKey={key}
            cell={cell}
            hasEdge={index === 0 || index === arrival}
            isActive={isActive && activeStep === key}
          />
        );
      })}
      <td className={styles.edge}>
        <TwoLines cell={row.ready} />
      </td>
      <td className={styles.edge}>
        <TwoLines cell={row.conductor} />
      </td>
    </tr>
  );
});
