import type { WireStep } from '@stubpost/shared';
import { StepMark } from '../../../components/step-mark';
import { STEP_STATE_WORDS } from '../../../components/words';
import { formatTime } from '../../../lib/time-display';
import { isSettled } from '../model/next-act';
import { recordLine, recordWords } from '../model/record-words';
import { recordOf } from '../model/turn-records';
import { OnwardSign } from './phone-icons';
import styles from './phone-parts.module.css';
import type { Place } from './place';
import { useTurnScene } from './turn-context';
import { useHeadingFocus } from './use-heading-focus';

export interface AllStepsProps {
  /** Brings an open step under the bar. */
  onPick: (key: string) => void;
  onGo: (place: Place) => void;
  onBack: () => void;
}

/** Every step of the turn with how it stands. An open one goes under the bar, also out of order; a recorded one opens. */
export function AllSteps({ onPick, onGo, onBack }: AllStepsProps) {
  const { turn } = useTurnScene();
  const heading = useHeadingFocus();
  const said = turn.steps.flatMap((step) => step.remarks);
  const findings = turn.findings.filter((finding) => !said.includes(finding));
  return (
    <>
      <h1 tabIndex={-1} ref={heading}>
        All steps
      </h1>
      <ol className={styles.lines}>
        <MovementItem recordKey="arrival" onGo={onGo} />
        {turn.steps.map((step) => (
          <StepItem
            key={step.key}
            step={step}
            onOpen={() => (isSettled(step) ? onGo({ kind: 'record', key: step.key }) : onPick(step.key))}
          />
        ))}
        <MovementItem recordKey="departure" onGo={onGo} />
      </ol>
      {findings.length > 0 && (
        <section className={styles.said} aria-label="What is open about the entries">
          {findings.map((finding) => (
            <p key={finding}>{finding}</p>
          ))}
        </section>
      )}
      <button type="button" className={`${styles.button} ${styles.wide}`} onClick={onBack}>
        Back
      </button>
    </>
  );
}

function StepItem({ step, onOpen }: { step: WireStep; onOpen: () => void }) {
  const { turn } = useTurnScene();
  return (
    <li>
      <button type="button" className={styles.line} onClick={onOpen} disabled={step.state === 'not-needed'}>
        <StepMark kind={step.kind} state={step.state} source={step.source} size={26} />
        <StepWords step={step} zone={turn.zone} />
        <span className={styles.push}>
          <OnwardSign size={22} />
        </span>
      </button>
      {step.remarks.map((remark) => (
        <p key={remark} className={styles.remark}>
          {remark}
        </p>
      ))}
    </li>
  );
}

/** The arrival or the departure among the steps, once it is recorded. */
function MovementItem({
  recordKey,
  onGo,
}: {
  recordKey: 'arrival' | 'departure';
  onGo: (place: Place) => void;
}) {
  const { turn, entries } = useTurnScene();
  const record = recordOf(turn, entries, recordKey);
  if (record === null) return null;
  return (
    <li>
      <button type="button" className={styles.line} onClick={() => onGo({ kind: 'record', key: recordKey })}>
        <StepMark kind="movement" state="done" source={record.source} size={26} />
        <span className={styles.stepWords}>{recordLine(record, turn.zone)}</span>
        <span className={styles.push}>
          <OnwardSign size={22} />
        </span>
      </button>
    </li>
  );
}

function StepWords({ step, zone }: { step: WireStep; zone: string }) {
  if (isSettled(step) && step.doneAt !== null) {
    return (
      <span className={styles.stepWords}>
        {recordWords(step, zone)}
        {step.state === 'in-question' && <b> · {STEP_STATE_WORDS['in-question']}</b>}
      </span>
    );
  }
  return (
    <span className={styles.stepWords}>
      <b>{step.shortLabel}</b>
      <span className="muted">
        {' '}
        {STEP_STATE_WORDS[step.state]}
        {step.dueAt !== null && `, by ${formatTime(step.dueAt, zone)}`}
      </span>
    </span>
  );
}
