import { StepMark } from '../../../components/step-mark';
import { formatClock } from '../../../lib/time-display';
import { readingWords } from '../model/act-form';
import { accountWords } from '../model/record-words';
import { recordOf, wayBack, type TurnRecord } from '../model/turn-records';
import { InQuestion } from './in-question';
import { OnwardSign } from './phone-icons';
import styles from './phone-parts.module.css';
import type { Place } from './place';
import { RecordCorrections } from './record-corrections';
import { useTurnScene } from './turn-context';
import { useHeadingFocus } from './use-heading-focus';

/** One record: when, how it is known, every account of it, what was asked about it, and the way back from it. */
export function RecordPlace({ recordKey, onGo }: { recordKey: string; onGo: (place: Place) => void }) {
  const { turn, entries } = useTurnScene();
  const heading = useHeadingFocus();
  const record = recordOf(turn, entries, recordKey);
  const step = turn.steps.find(({ key }) => key === recordKey);
  return (
    <>
      <h1 className={styles.lead} tabIndex={-1} ref={heading}>
        <StepMark
          kind={step?.kind ?? 'movement'}
          state={step?.state ?? 'done'}
          source={record?.source ?? null}
          size={30}
        />
        {record?.label ?? step?.shortLabel ?? 'Record'}
      </h1>
      {record === null ? <p>Nothing stands recorded here.</p> : <Facts record={record} />}
      <InQuestion step={recordKey} />
      {step !== undefined &&
        step.state !== 'in-question' &&
        step.remarks.map((remark) => <p key={remark}>{remark}</p>)}
      <RecordCorrections recordKey={recordKey} />
      <CardLine recordKey={recordKey} onGo={onGo} />
      {record !== null && <WayBackButton record={record} onGo={onGo} />}
      <button
        type="button"
        className={`${styles.button} ${styles.wide}`}
        onClick={() => onGo({ kind: 'steps' })}
      >
        Back
      </button>
    </>
  );
}

function Facts({ record }: { record: TurnRecord }) {
  const { turn } = useTurnScene();
  const { source, by, saidBy } = record;
  const read = readingWords(record.reading);
  return (
    <dl className={styles.lines}>
      <div className={styles.line}>
        <dt>Made</dt>
        <dd className={styles.push}>
          <b>{formatClock(record.at, turn.zone)}</b>
        </dd>
      </div>
      <div className={styles.line}>
        <dt>Known</dt>
        <dd className={styles.push}>{accountWords({ source, by: by?.name ?? null, saidBy })}</dd>
      </div>
      {read !== '' && (
        <div className={styles.line}>
          <dt>Read off</dt>
          <dd className={styles.push}>{read}</dd>
        </div>
      )}
    </dl>
  );
}

function CardLine({ recordKey, onGo }: { recordKey: string; onGo: (place: Place) => void }) {
  const { steps } = useTurnScene();
  if (steps.find(({ key }) => key === recordKey)?.instruction === undefined) return null;
  return (
    <button type="button" className={styles.line} onClick={() => onGo({ kind: 'card', step: recordKey })}>
      Instruction card
      <span className={styles.push}>
        <OnwardSign size={22} />
      </span>
    </button>
  );
}

function WayBackButton({ record, onGo }: { record: TurnRecord; onGo: (place: Place) => void }) {
  const { turn, me } = useTurnScene();
  const way = wayBack(record, turn, me.id);
  if (way === null) {
    return <p className="muted">Made by somebody else. Its writer or the desk can take it back.</p>;
  }
  return (
    <button
      type="button"
      className={`${styles.button} ${styles.wide}`}
      onClick={() => onGo(way === 'withdraw' ? { kind: 'withdraw', record } : { kind: 'correct', record })}
    >
      {way === 'withdraw' ? 'Withdraw' : 'Ask for correction'}
    </button>
  );
}
