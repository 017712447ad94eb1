import type { WireTurn } from '@stubpost/shared';
import { formatTime } from '../../../lib/time-display';
import { labelOf } from '../model/turn-records';
import type { ActWays } from './act-ways';
import { RadioSign } from './phone-icons';
import styles from './phone-parts.module.css';
import { useTurnScene } from './turn-context';

/** A step that the desk wrote from the radio: does the crew agree? No answer leaves it as it stands. */
export function RadioAsk({
  asked,
  ways,
}: {
  asked: NonNullable<WireTurn['asksAgreement']>[number];
  ways: ActWays;
}) {
  const { turn } = useTurnScene();
  const label = labelOf(turn, asked.step);
  const said = asked.saidBy === null ? '' : `Said by ${asked.saidBy}. `;
  const written = asked.by === null ? '' : `Written by ${asked.by}. `;
  return (
    <section className={styles.said} aria-label={`${label}, by radio`}>
      <h2 className={styles.lead}>
        <RadioSign size={26} />
        {label}
      </h2>
      <p>
        <b>By radio, {formatTime(asked.at, turn.zone)} – agree?</b> {said}
        {written}
      </p>
      <div className={styles.pairs}>
        <button
          type="button"
          className={styles.button}
          onClick={() => ways.onRecord({ kind: 'agreed', target: asked.entryId }, `Agreed: ${label}`, null)}
        >
          Agree
        </button>
        <button
          type="button"
          className={styles.button}
          onClick={() => ways.onGo({ kind: 'not-so', entryId: asked.entryId })}
        >
          Not so
        </button>
      </div>
    </section>
  );
}
