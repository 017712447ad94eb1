import { rolesOf } from '@stubpost/shared';
import { Caution } from '../../../components/caution';
import { formatClock } from '../../../lib/time-display';
import { handbrakeWords, readingWords } from '../model/act-form';
import styles from './phone-parts.module.css';
import { SecondBar } from './second-bar';
import { useTurnScene } from './turn-context';
import type { ActOnPage } from './use-act';

/** The second bar of a handbrake release, in another place than the first: the record in full, and what it stands on. */
export function SecondTouch({ page, onRecord }: { page: ActOnPage; onRecord: () => void }) {
  return (
    <>
      <SecondBar onRecord={onRecord}>Released: {handbrakeWords(page.reading)}</SecondBar>
      <ReleaseFacts />
      <Caution>
        Records what you did. It does not say that the train may move safely: your rules, the law in force and
        qualified people decide.
      </Caution>
    </>
  );
}

/** What is recorded about the train that the release rests on. */
function ReleaseFacts() {
  const { turn, steps } = useTurnScene();
  const { secure, manCab } = rolesOf(steps);
  const of = (some: readonly { key: string }[]) =>
    turn.steps.find((step) => some.some(({ key }) => key === step.key));
  const set = of(secure);
  const cab = of(manCab);
  const time = (doneAt: string | null | undefined): string =>
    doneAt === null || doneAt === undefined ? 'not recorded' : formatClock(doneAt, turn.zone);
  return (
    <div className={styles.lines}>
      <p className={styles.line}>
        <span>Set {time(set?.doneAt)}</span>
        <span className={styles.push}>{set?.reading?.cars?.join(', ') ?? readingWords(set?.reading)}</span>
      </p>
      <p className={styles.line}>
        <span>Engineer in leaving cab</span>
        <span className={styles.push}>{time(cab?.doneAt)}</span>
      </p>
      <p className={styles.line}>
        <span>Brake pipe then</span>
        <span className={styles.push}>
          {cab?.reading?.brakePipePsi === undefined ? 'no reading' : `${cab.reading.brakePipePsi} psi`}
        </span>
      </p>
      <p className={styles.line}>
        <span>Blue signal</span>
        <span className={styles.push}>
          {turn.blueSignal === null
            ? 'none recorded'
            : `up since ${formatClock(turn.blueSignal.since, turn.zone)}`}
        </span>
      </p>
    </div>
  );
}
