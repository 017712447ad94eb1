import type { WireTrack } from '@stubpost/shared';
import { StepMark } from '../../../components/step-mark';
import type { TurnNow } from '../../../lib/turn/turn-now';
import { standWords } from '../model/stand-words';
import styles from './turn-panel.module.css';

/** The set where it stands: bumping post, cars in order, on which a handbrake stands set by the records. */
export function StandPicture({ turn, track }: { turn: TurnNow; track: WireTrack | undefined }) {
  const { cars } = turn;
  if (cars.length === 0) return null;
  const braked = turn.securement?.carsStillSet ?? [];
  return (
    <section className={styles.stand} aria-label="Where the set stands">
      <h3 className={styles.heading}>
        {turn.set === null ? 'The train' : `Set ${turn.set}`} where it stands{' '}
        <span className={styles.plain}>{standWords(turn, track)}</span>
      </h3>
      <div className={styles.cars}>
        <span className={styles.bumper} aria-label="bumping post" role="img" />
        <ol>
          {cars.map((car) => (
            <li key={car}>
              {braked.includes(car) && <StepMark kind="securement" state="done" />}
              {car}
              {braked.includes(car) && <span className="unseen">, handbrake set</span>}
            </li>
          ))}
        </ol>
        {turn.outboundTrain !== null && <span aria-hidden="true">→</span>}
      </div>
    </section>
  );
}
