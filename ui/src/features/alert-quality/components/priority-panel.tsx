import type { WireAlertQuality } from '@stubpost/shared';
import { PRIORITY_WORDS } from '../../../components/words';
import { count, countedWords, percent } from '../model/quality-words';
import { PlainTable } from './plain-table';
import { ShareBars } from './share-bars';
import charts from './charts.module.css';

/** The priorities beside the mix they should have. */
export function PriorityPanel({ quality }: { quality: WireAlertQuality }) {
  const { priorities } = quality;
  return (
    <section className="sp-panel" aria-labelledby="priorities">
      <h2 id="priorities">Priorities</h2>
      <ShareBars
        bars={priorities.map((part) => ({
          label: PRIORITY_WORDS[part.priority],
          figures: part,
          target: part.target,
        }))}
      />
      <p className={charts.key} aria-hidden="true">
        <span>share here, with its interval</span>
        <span className={charts.keyTarget}>target</span>
      </p>
      <PlainTable
        caption="Alerts by priority"
        heads={[
          ['Priority', 'words'],
          ['Alerts', 'number'],
          ['Of all', 'words'],
          ['Target', 'number'],
        ]}
        rows={priorities.map((part) => ({
          key: part.priority,
          cells: [PRIORITY_WORDS[part.priority], count(part.count), countedWords(part), percent(part.target)],
        }))}
      />
      <footer>
        The priority an alert had last. Target: about 5, 15 and 80 in 100; EEMUA 191 and ISA-18.2,
        second-hand. Interval: Wilson, 95 %.
      </footer>
    </section>
  );
}
