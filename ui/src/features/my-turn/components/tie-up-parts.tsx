import { TIE_UP_CHECKS, type TieUpCheck } from '@stubpost/shared';
import { formatClock } from '../../../lib/time-display';
import { defectLine } from '../model/defect-words';
import type { TieUpForm } from '../model/tie-up';
import { DoneSign, HollowSign } from './phone-icons';
import styles from './phone-parts.module.css';
import { useTurnScene } from './turn-context';

interface PartProps {
  form: TieUpForm;
  onForm: (form: TieUpForm) => void;
}

/** What each check is called where it is ticked. */
export const CHECK_WORDS: Record<TieUpCheck, string> = {
  lights: 'Lights',
  doors: 'Doors',
  heat: 'Heat',
  chocks: 'Chocks',
};

/** Which set, where it stands, how it came. */
export function TieUpHead() {
  const { turn } = useTurnScene();
  const came = turn.inbound?.actualArrivalAt ?? null;
  const how =
    turn.inbound === null || came === null
      ? ''
      : `, came in as ${turn.inbound.train} at ${formatClock(came, turn.zone)}`;
  return (
    <div>
      <h1>Tie-up, {turn.set === null ? 'set not known' : `set ${turn.set}`}</h1>
      <p>
        {turn.track === null ? 'No track' : `Track ${turn.track}`}
        {how}
      </p>
      {turn.outbound !== null && (
        <p>
          <b>Planned to leave as {turn.outbound.train}.</b> Tie it up only if it stays.
        </p>
      )}
    </div>
  );
}

/** Seen to, one touch each. What is not touched is recorded as not seen to. */
export function TieUpChecks({ form, onForm }: PartProps) {
  const toggle = (check: TieUpCheck): void =>
    onForm({
      ...form,
      checks: TIE_UP_CHECKS.filter((each) =>
        each === check ? !form.checks.includes(each) : form.checks.includes(each),
      ),
    });
  return (
    <section className={styles.next} aria-labelledby="tie-up-checks">
      <h2 id="tie-up-checks" className={styles.part}>
        Seen to
      </h2>
      <div className={styles.pairs} role="group" aria-labelledby="tie-up-checks">
        {TIE_UP_CHECKS.map((check) => {
          const isSeenTo = form.checks.includes(check);
          return (
            <button
              key={check}
              type="button"
              className={`${styles.button} ${styles.ticked}`}
              aria-pressed={isSeenTo}
              onClick={() => toggle(check)}
            >
              {isSeenTo ? <DoneSign size={24} /> : <HollowSign size={24} />}
              {CHECK_WORDS[check]}
            </button>
          );
        })}
      </div>
    </section>
  );
}

/** What is bad about the set, and the way to report more. */
export function TieUpDefects({ onDefect }: { onDefect: () => void }) {
  const { turn } = useTurnScene();
  const defects = turn.defects ?? [];
  return (
    <section className={styles.next} aria-labelledby="tie-up-defects">
      <h2 id="tie-up-defects" className={styles.part}>
        Defects: {defects.length === 0 ? 'none reported' : defects.length}
      </h2>
      {defects.length > 0 && (
        <ul>
          {defects.map((defect) => (
            <li key={defect.entryId}>{defectLine(defect)}</li>
          ))}
        </ul>
      )}
      <button type="button" className={`${styles.button} ${styles.wide}`} onClick={onDefect}>
        Report a defect
      </button>
    </section>
  );
}

/**
 * Whether the set keeps its air. Off air for more than four hours asks for a Class I or IA test before the next
 * service. Source: 49 CFR 238.315(a)(2); text of the current edition not confirmed by the railroad.
 */
export function TieUpAir({ form, onForm }: PartProps) {
  return (
    <section className={styles.next} aria-labelledby="tie-up-air">
      <h2 id="tie-up-air" className={styles.part}>
        Air
      </h2>
      <div className={styles.pairs} role="group" aria-labelledby="tie-up-air">
        <button
          type="button"
          className={styles.button}
          aria-pressed={form.offAir === true}
          onClick={() => onForm({ ...form, offAir: true })}
        >
          Cut off
        </button>
        <button
          type="button"
          className={styles.button}
          aria-pressed={form.offAir === false}
          onClick={() => onForm({ ...form, offAir: false })}
        >
          Stays on air
        </button>
      </div>
      {form.offAir === true && (
        <p>Its time off air starts now. Over 4 h asks for a Class I or IA test: 49 CFR 238.315(a)(2).</p>
      )}
    </section>
  );
}
