import type { WireAlertQuality } from '@stubpost/shared';
import { fewestForVerdict, yardsticksOf, type TargetSource } from '../model/yardsticks';
import { PlainTable } from './plain-table';
import styles from './quality.module.css';

const SOURCE_WORDS: Record<TargetSource, string> = {
  published: 'EEMUA 191, ISA-18.2 (second-hand)',
  ours: 'our choice',
};

function verdict(isMet: boolean | null) {
  if (isMet === null) return <span className="muted">no verdict</span>;
  return isMet ? 'within' : <span className={styles.outside}>outside</span>;
}

/** The figures of the desk beside what they should be. */
export function YardstickPanel({ quality }: { quality: WireAlertQuality }) {
  return (
    <section className="sp-panel" aria-labelledby="yardsticks">
      <h2 id="yardsticks">Beside what they should be</h2>
      <PlainTable
        caption="Figures beside their targets"
        heads={[
          ['Figure', 'words'],
          ['Here', 'number'],
          ['Target', 'words'],
          ['Verdict', 'words'],
          ['Source of the target', 'words'],
        ]}
        rows={yardsticksOf(quality).map(({ name, here, target, isMet, source }) => ({
          key: name,
          cells: [name, here, target, verdict(isMet), <span className="nowrap">{SOURCE_WORDS[source]}</span>],
        }))}
      />
      <footer>
        The published targets are for the desk of one person; second-hand: as others quote them. ISA-18.2 of
        2016 is said to warn against means and to have dropped the count per day, so look at the distribution
        first. No verdict: fewer than {fewestForVerdict} periods or alerts, or a target without a number.
      </footer>
    </section>
  );
}
