import type { Instant, WireReading } from '@stubpost/shared';
import { Fragment } from 'react';
import { StepMark } from '../../../components/step-mark';
import { stepWords } from '../../../lib/turn/step-words';
import type { TurnNow } from '../../../lib/turn/turn-now';
import { stepGroups, type StepRow } from '../model/step-rows';
import styles from './turn-panel.module.css';

export interface StepsTableProps {
  turn: TurnNow;
  /** Opens the form for an open step; absent for people who may not record. */
  onRelay?: ((stepKey: string) => void) | undefined;
  /** Opens the form to take a record back or to ask for its correction; absent for people who may not. */
  onTakeBack?: ((entry: EntryToChange) => void) | undefined;
}

/** An entry that a form is to take back or to correct. */
export interface EntryToChange {
  entryId: string;
  words: string;
  at: Instant;
  reading: WireReading | null;
}

/** Steps of the turn: due, latest, done, how known. The name of a step opens what can be done about it. */
export function StepsTable({ turn, onRelay, onTakeBack }: StepsTableProps) {
  const act = (row: StepRow): (() => void) | undefined => {
    const { step } = row;
    const { entryId, doneAt: at, reading } = step;
    if (at !== null && entryId !== null && onTakeBack !== undefined) {
      return () => onTakeBack({ entryId, words: stepWords(step, turn.zone), at, reading });
    }
    if (step.doneAt !== null || onRelay === undefined || turn.annulled !== null) return undefined;
    return () => onRelay(step.key);
  };
  return (
    <table className={styles.steps}>
      <caption className="unseen">Steps of the turn</caption>
      <colgroup>
        <col />
        <col style={{ width: 50 }} />
        <col className={styles.latest} style={{ width: 52 }} />
        <col style={{ width: 70 }} />
        <col className={styles.known} />
      </colgroup>
      <thead>
        <tr>
          <th scope="col">Step</th>
          <th scope="col" className={styles.number}>
            Due
          </th>
          <th scope="col" className={`${styles.number} ${styles.latest}`}>
            Latest
          </th>
          <th scope="col" className={styles.number}>
            Done
          </th>
          <th scope="col">How known</th>
        </tr>
      </thead>
      {stepGroups(turn).map((group) => (
        <tbody key={group.anchor}>
          <tr className={styles.anchor}>
            <th colSpan={5} scope="rowgroup">
              {group.heading}
            </th>
          </tr>
          {group.rows.map((row) => (
            <Fragment key={row.step.key}>
              <StepTableRow row={row} hasLeft={turn.departedAt !== null} onAct={act(row)} />
              {row.remarks.map((remark) => (
                <tr key={remark} className={styles.remark}>
                  <td colSpan={5}>{remark}</td>
                </tr>
              ))}
            </Fragment>
          ))}
        </tbody>
      ))}
    </table>
  );
}

interface RowProps {
  row: StepRow;
  /** The train has left, so that its record changes only with a supervisor's yes. */
  hasLeft: boolean;
  onAct: (() => void) | undefined;
}

function StepTableRow({ row, hasLeft, onAct }: RowProps) {
  const { step } = row;
  const takeBack = hasLeft ? 'Ask for correction' : 'Withdraw';
  const verb = step.doneAt === null ? 'Relay' : takeBack;
  return (
    <tr className={row.isNext ? styles.next : undefined}>
      <th scope="row">
        <StepMark kind={step.kind} state={step.state} source={step.source} />
        {onAct === undefined ? (
          row.name
        ) : (
          <button type="button" className={styles.stepName} onClick={onAct} title={`${verb}: ${step.label}`}>
            {row.name}
            <span className="unseen">, {verb.toLowerCase()}</span>
          </button>
        )}
      </th>
      <td className={styles.number}>{row.due}</td>
      <td className={`${styles.number} ${styles.latest}`}>{row.latest}</td>
      <td className={styles.number}>
        <span className={row.isEstimate ? 'estimate' : undefined}>{row.done}</span>
      </td>
      <td>
        <small>{row.known}</small>
      </td>
    </tr>
  );
}
