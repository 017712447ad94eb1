import type { StepKind, StepState } from '@stubpost/shared';
import { StepMark } from '../../../components/step-mark';
import { HealthFlag } from '../../../components/flags';
import styles from './legend.module.css';

const kinds: [StepKind, string][] = [
  ['securement', 'Handbrake'],
  ['air', 'Air'],
  ['brake-test', 'Brake test'],
  ['movement', 'Leaving cab'],
  ['ends', 'Ends changed'],
];

const states: [StepState, string][] = [
  ['not-due', 'To do'],
  ['done', 'Done'],
  ['overdue', 'Overdue'],
  ['not-needed', 'Not needed'],
  ['withdrawn', 'Withdrawn'],
  ['in-question', 'In question'],
  ['blocked', 'Blocked'],
];

/** What the shapes of the picture mean, in words beside each. */
export function Legend({ isHalf }: { isHalf: boolean }) {
  return (
    <aside className={`${styles.legend} ${isHalf ? styles.half : ''}`} aria-label="Legend">
      <dl className={styles.lanes}>
        <dt>Plan</dt>
        <dd>scheduled times, a tick where each step is due</dd>
        <dt>Work</dt>
        <dd>
          from the post, where it stopped, to now; dashed until it leaves. Hollow post: still inbound. Upper
          marks: in a cab, lower: on the ground. Four cells from 8 h on: set, tested, ends, ready
        </dd>
        <dt>Next</dt>
        <dd>
          hatch is work to do, line is time to spare, upright is forecast ready, bracket is minutes short
        </dd>
      </dl>
      <ul className={styles.signs}>
        {kinds.map(([kind, words]) => (
          <li key={kind}>
            <StepMark kind={kind} state="not-due" />
            {words}
          </li>
        ))}
        {states.map(([state, words]) => (
          <li key={state}>
            <StepMark kind="brake-test" state={state} />
            {words}
          </li>
        ))}
        <li>
          <StepMark kind="brake-test" state="done" source="by-radio" />
          By radio or later
        </li>
      </ul>
      <ul className={styles.flags}>
        <li>
          <HealthFlag health="tight" />
          less than 1 min to spare
        </li>
        <li>
          <HealthFlag health="short" />
          the work no longer fits
        </li>
        <li>
          <HealthFlag health="late" />
          scheduled departure has passed
        </li>
        <li>
          <b>+4 −3</b>
          minutes to spare or short, rounded down
        </li>
      </ul>
    </aside>
  );
}
