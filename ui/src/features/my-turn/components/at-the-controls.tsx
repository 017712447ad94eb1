import { formatClock } from '../../../lib/time-display';
import type { ControlsBar } from '../model/controls';
import { LaterSign, OnPhoneSign, RadioSign } from './phone-icons';
import styles from './phone-parts.module.css';
import { useTurnScene } from './turn-context';

/** Why the engineer's phone records nothing here, in words, and who can. */
export function AtTheControls({ bar }: { bar: ControlsBar }) {
  const { turn, me } = useTurnScene();
  const conductor = turn.crew.find((member) => member.as === 'conductor' && member.personId !== me.id);
  return (
    <>
      <section className={styles.said}>
        <h2>
          {bar.kind === 'at-controls'
            ? 'No entry from this phone at the controls'
            : 'Not from the engineer’s phone'}
        </h2>
        {bar.kind === 'at-controls' && (
          <p>
            Engineer {me.name}, in the leaving cab since {formatClock(bar.since, turn.zone)}
            {bar.by === null ? '' : ` (${bar.by})`}.
          </p>
        )}
        <p>
          Federal rule: the person at the controls uses no device, the railroad’s or their own, while the
          train moves, a crew member is on the ground, or anyone helps prepare it to move. 49 CFR 220.305,
          220.307; the railroad’s own rules may ask for more.
        </p>
      </section>
      <section>
        <h3>How the step gets recorded</h3>
        <ul className={styles.lines}>
          <li className={styles.line}>
            <OnPhoneSign size={26} />
            {conductor === undefined ? 'The conductor records it' : `Conductor ${conductor.name} records it`}
          </li>
          <li className={styles.line}>
            <RadioSign size={26} />
            Say it by radio, the desk writes it
          </li>
          <li className={styles.line}>
            <LaterSign size={26} />
            {bar.kind === 'at-controls'
              ? 'Enter it later, after the next arrival'
              : 'Enter it later, off the controls'}
          </li>
        </ul>
      </section>
    </>
  );
}
