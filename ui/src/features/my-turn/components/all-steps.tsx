import type { WireStep } from '@stubpost/shared';
import { StepMark } from '../../../components/step-mark';
import { STEP_STATE_WORDS } from '../../../components/words';
import { formatClock, formatTime } from '../../../lib/time-display';
import { isSettled } from '../model/next-act';
import { recordWords } from './last-entry';
import { OnwardSign } from './phone-icons';
import styles from './phone-parts.module.css';
import { useTurnScene } from './turn-context';
import { useHeadingFocus } from './use-heading-focus';

export interface AllStepsProps {
  onPick: (key: string) => void;
  onBriefing: () => void;
  onBack: () => void;
}

/** Every step of the turn with how it stands. Touching one brings it under the bar, also out of order. */
export function AllSteps({ onPick, onBriefing, onBack }: AllStepsProps) {
  const { turn } = useTurnScene();
  const heading = useHeadingFocus();
  const said = turn.steps.flatMap((step) => step.remarks);
  const findings = turn.findings.filter((finding) => !said.includes(finding));
  return (
    <>
      <h1 tabIndex={-1} ref={heading}>
        All steps
      </h1>
      <Briefing onRecord={onBriefing} />
      <ol className={styles.lines}>
        {turn.steps.map((step) => (
          <li key={step.key}>
            <button type="button" className={styles.line} onClick={() => onPick(step.key)}>
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
        ))}
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

/** The safety briefing with everybody's agreement, which comes before a device is used in the controlling cab. */
function Briefing({ onRecord }: { onRecord: () => void }) {
  const { entries, turn } = useTurnScene();
  const briefing = entries.findLast(({ kind }) => kind === 'briefing');
  return (
    <div className={styles.lines}>
      {briefing === undefined ? (
        <button type="button" className={styles.line} onClick={onRecord}>
          Safety briefing, all agreed
          <span className={`${styles.push} ${styles.underlined}`}>Record now</span>
        </button>
      ) : (
        <p className={styles.line}>
          Safety briefing {formatClock(briefing.observedAt, turn.zone)}
          <span className={styles.push}>{briefing.by?.name}</span>
        </p>
      )}
    </div>
  );
}
