import type { StepCell } from '../model/step-cell';
import type { Cell, PlanCell } from '../model/table-cells';
import styles from './turn-table.module.css';

/** A cell of two lines: the fact, and under it what it is to be compared with. */
export function TwoLines({ cell }: { cell: Cell }) {
  return (
    <>
      <span className={cell.estimate === true ? 'estimate' : undefined}>{cell.text}</span>
      {cell.small !== undefined && (
        <small className={cell.smallEstimate === true ? `${styles.ink} estimate` : undefined}>
          {cell.small}
        </small>
      )}
    </>
  );
}

/** How the turn stands: flag and word, and who has its alert. */
export function FlagCell({ cell }: { cell: PlanCell }) {
  return (
    <>
      {cell.flag === null ? (
        <span>{cell.text}</span>
      ) : (
        <span className={`flag ${cell.flag}`}>{cell.text}</span>
      )}
      {(cell.small !== '' || cell.owed !== '') && (
        <small className={cell.owed === '' ? undefined : styles.ink}>
          {cell.small}
          {cell.owed !== '' && <b>{cell.owed}</b>}
        </small>
      )}
    </>
  );
}

export interface StepTableCellProps {
  turnId: string;
  stepKey: string;
  cell: StepCell | null;
  hasEdge: boolean;
  isActive: boolean;
}

/** A step: mark, time or word, and under it when it was due or how it is known. */
export function StepTableCell({ turnId, stepKey, cell, hasEdge, isActive }: StepTableCellProps) {
  const className = `${styles.step} ${hasEdge ? styles.edge : ''}`;
  if (cell === null) return <td className={className} aria-label="not in this turn’s plan" />;
  return (
    <td className={className} data-turn={turnId} data-step={stepKey} tabIndex={isActive ? 0 : -1}>
      {cell.mark !== null && <i className={cell.mark} aria-hidden="true" />}
      {cell.strong && cell.text !== '' ? (
        <b>{cell.text}</b>
      ) : (
        <span className={cell.estimate ? 'estimate' : undefined}>{cell.text}</span>
      )}
      {cell.small !== '' && <small>{cell.small}</small>}
    </td>
  );
}
