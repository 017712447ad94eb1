import type { PrecisionVerdict, WireAlertQuality } from '@stubpost/shared';
import { count, countedWords, percent } from '../model/quality-words';
import { PlainTable } from './plain-table';
import { ShareBars } from './share-bars';
import styles from './quality.module.css';

/** The verdicts in the order in which they are told. */
const VERDICTS: readonly PrecisionVerdict[] = [
  'left-late',
  'held',
  'taken',
  'needless',
  'annulled',
  'no-departure',
];

function verdictWords(verdict: PrecisionVerdict, thresholdSeconds: number): string {
  const words: Record<PrecisionVerdict, string> = {
    'left-late': `Left more than ${thresholdSeconds} s late`,
    held: 'Held, then left with the end of the hold',
    taken: 'Left on time, somebody had taken the alert',
    needless: 'Left on time, nobody had done anything about it',
    annulled: 'Annulled: not judged',
    'no-departure': 'No departure on record: not judged',
  };
  return words[verdict];
}

/** How many alerts of late departures were right, between what is sure and what is possible. */
export function PrecisionPanel({ quality }: { quality: WireAlertQuality }) {
  const { precision, thresholdSeconds, warned } = quality;
  const { atLeast, atMost, verdicts } = precision;
  return (
    <section className="sp-panel" aria-labelledby="precision">
      <h2 id="precision">Precision of late departures</h2>
      {atLeast.counted === 0 ? (
        <p>Nothing to judge: no train with such an alert has left in these days.</p>
      ) : (
        <>
          <p className={styles.headline}>
            <b>{percent(atLeast.share)}</b> sure, <b>{percent(atMost.share)}</b> possible
          </p>
          <dl className={styles.facts}>
            <dt>At least</dt>
            <dd>{countedWords(atLeast)}</dd>
            <dt>At most</dt>
            <dd>{countedWords(atMost)}</dd>
          </dl>
          <ShareBars
            bars={[
              { label: 'At least', figures: atLeast, target: null },
              { label: 'At most', figures: atMost, target: null },
            ]}
          />
        </>
      )}
      <PlainTable
        caption="What became of the trains with an alert of a late departure"
        heads={[
          ['What became of the train', 'words'],
          ['Alerts', 'number'],
        ]}
        rows={VERDICTS.map((verdict) => ({
          key: verdict,
          cells: [verdictWords(verdict, thresholdSeconds), count(verdicts[verdict])],
        }))}
      />
      <p>
        <b>Warned of:</b>{' '}
        {warned.counted === 0
          ? 'no train left late.'
          : `of the trains that left late, ${countedWords(warned)}, had such an alert before they left.`}
      </p>
      <footer>
        Right is an alert whose train would have left late without action. The record shows only what
        happened: at least those that left late all the same, counted from the schedule or from the end of a
        hold; at most also those that left on time after somebody had held them or taken the alert. Whether
        these would have been late otherwise nobody can know. The limit is this terminal’s own. Interval:
        Wilson, 95 %.
      </footer>
    </section>
  );
}
