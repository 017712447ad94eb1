import { formatServiceDateWithYear } from '../../../lib/time-display';
import styles from './phone-parts.module.css';
import { useTurnScene } from './turn-context';
import { useHeadingFocus } from './use-heading-focus';
import { useTurnPlan } from './use-turn-rules';

/** The railroad's own words for one step, with the version of the plan they belong to. */
export function CardPlace({ step, onBack }: { step: string; onBack: () => void }) {
  const { steps } = useTurnScene();
  const plan = useTurnPlan();
  const heading = useHeadingFocus();
  const planned = steps.find(({ key }) => key === step);
  const paragraphs = (planned?.instruction ?? '').split(/\n{2,}/).filter((text) => text.trim() !== '');
  return (
    <>
      <div>
        <p className="muted">Instruction card</p>
        <h1 tabIndex={-1} ref={heading}>
          {planned?.label ?? 'No such step'}
        </h1>
      </div>
      {paragraphs.map((text) => (
        <p key={text} className={styles.ownWords}>
          {text}
        </p>
      ))}
      {plan !== undefined && (
        <p className="muted">
          {plan.name}, version {plan.version}, in force from {formatServiceDateWithYear(plan.effectiveFrom)}.
          The railroad’s own words.
        </p>
      )}
      <button type="button" className={`${styles.button} ${styles.wide}`} onClick={onBack}>
        Back
      </button>
    </>
  );
}
