import type { CorrectionState } from '@stubpost/shared';
import { useId } from 'react';
import { formatServiceDate } from '../../../lib/time-display';
import { askedText, decidedText, sidesOf, subjectText } from '../model/correction-view';
import styles from './corrections.module.css';
import { DecisionPart, type DecisionPartProps } from './decision-part';

const stateWords: Record<CorrectionState, string> = {
  waiting: 'Waits',
  approved: 'Approved',
  declined: 'Declined',
};

/** One correction: what was recorded beside what is asked for, who asked and why, and what is decided. */
export function CorrectionCard({ correction, terminal, onOpen }: DecisionPartProps) {
  const title = useId();
  const decided = decidedText(correction);
  return (
    <article className={`sp-panel ${styles.card}`} aria-labelledby={title}>
      <header>
        <h2 id={title}>{subjectText(correction)}</h2>
        <span className="muted">{formatServiceDate(correction.serviceDate)}</span>
        <span className={styles.state} data-state={correction.state}>
          {stateWords[correction.state]}
        </span>
      </header>
      <div className={styles.sides}>
        <table className="sp-table">
          <thead>
            <tr>
              <td />
              <th scope="col">Recorded</th>
              <th scope="col">Asked for</th>
            </tr>
          </thead>
          <tbody>
            {sidesOf(correction).map(({ name, recorded, askedFor }) => (
              <tr key={name}>
                <th scope="row">{name}</th>
                <td>{recorded}</td>
                <td>
                  <b>{askedFor}</b>
                </td>
              </tr>
            ))}
          </tbody>
        </table>
        <dl className={styles.words}>
          <div>
            <dt>Reason</dt>
            <dd>{correction.reason}</dd>
          </div>
          <div>
            <dt className="unseen">Asked</dt>
            <dd className="muted">{askedText(correction)}</dd>
          </div>
          {decided !== '' && (
            <div>
              <dt className="unseen">Decided</dt>
              <dd>{decided}</dd>
            </div>
          )}
        </dl>
      </div>
      <DecisionPart correction={correction} terminal={terminal} onOpen={onOpen} />
    </article>
  );
}
