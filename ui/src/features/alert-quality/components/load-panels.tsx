import { loadPeriodSeconds, publishedBurstRule, type WireAlertQuality } from '@stubpost/shared';
import { formatStamp, formatTime } from '../../../lib/time-display';
import { columnsOf } from '../model/load-columns';
import { amount, count, percent, plural } from '../model/quality-words';
import { LoadHistogram } from './load-histogram';
import { PlainTable } from './plain-table';
import charts from './charts.module.css';
import styles from './quality.module.css';

const minutes = loadPeriodSeconds / 60;

/** How many alerts 10 minutes bring, at peak and over all. */
export function LoadHeadline({ quality }: { quality: WireAlertQuality }) {
  const { all, peak, peakFromTurns } = quality.load;
  return (
    <section className="sp-panel" aria-labelledby="load">
      <h2 id="load">Alerts in {minutes} minutes, at peak</h2>
      <p className={styles.headline}>
        <b>{amount(peak.median)}</b> in half of them, <b>{amount(peak.ninetyFifth)}</b> in 95 of 100
      </p>
      <dl className={styles.facts}>
        <dt>Raised</dt>
        <dd>
          {plural(all.alerts, 'alert')} on {plural(quality.watchedTurns, 'turn')}
        </dd>
        <dt>Mean in {minutes} min</dt>
        <dd>
          {amount(peak.mean)} at peak, {amount(all.mean)} over all
        </dd>
        <dt>Most in {minutes} min</dt>
        <dd>{amount(all.most)}</dd>
        <dt>Periods in burst</dt>
        <dd>
          {percent(all.shareInBurst)} of {count(all.periods)}
        </dd>
      </dl>
      <footer>
        Counted in periods of {minutes} minutes in which a turn stood at the terminal or an alert was raised:{' '}
        {count(all.periods)}. Peak: the {count(peak.periods)} with {amount(peakFromTurns)} or more turns on
        hand, as many as the busiest quarter has. “In half” and “in 95 of 100”: at most so many; quantiles of
        type 7.
      </footer>
    </section>
  );
}

/** The distribution, as a picture and as a table. */
export function LoadPanel({ quality }: { quality: WireAlertQuality }) {
  return (
    <section className="sp-panel" aria-labelledby="distribution">
      <h2 id="distribution">How often {minutes} minutes brought how many alerts</h2>
      <div className={charts.scroll} tabIndex={0} role="group" aria-label="Picture of the distribution">
        <LoadHistogram load={quality.load} />
      </div>
      <p className={charts.key} aria-hidden="true">
        <span>all watched periods</span>
        <span className={charts.keyHollow}>at peak</span>
      </p>
      <details className={styles.twin}>
        <summary>Table: periods by number of alerts</summary>
        <PlainTable
          caption="Periods of 10 minutes by number of alerts"
          heads={[
            ['Alerts', 'words'],
            ['Periods', 'number'],
            ['Share', 'number'],
            ['At peak', 'number'],
            ['Share at peak', 'number'],
          ]}
          rows={columnsOf(quality.load).map((column) => ({
            key: column.label,
            cells: [
              column.label,
              count(column.allPeriods),
              percent(column.all),
              count(column.peakPeriods),
              percent(column.peak),
            ],
          }))}
        />
      </details>
    </section>
  );
}

/** Each burst: when, how long, how many. */
export function BurstsPanel({ quality, zone }: { quality: WireAlertQuality; zone: string }) {
  const { startsAbove, endsBelow } = publishedBurstRule;
  return (
    <section className="sp-panel" aria-labelledby="bursts">
      <h2 id="bursts">Bursts</h2>
      {quality.bursts.length === 0 ? (
        <p>No burst in these days.</p>
      ) : (
        <PlainTable
          caption="Bursts"
          heads={[
            ['From', 'words'],
            ['To', 'words'],
            ['Alerts', 'number'],
          ]}
          rows={quality.bursts.map(({ fromAt, toAt, alerts, isOpen }) => ({
            key: fromAt,
            cells: [
              formatStamp(fromAt, zone),
              isOpen ? 'still going on' : formatTime(toAt, zone),
              count(alerts),
            ],
          }))}
        />
      )}
      <footer>
        A burst starts with more than {startsAbove} alerts in {minutes} minutes and ends before the first{' '}
        {minutes} minutes with fewer than {endsBelow}. EEMUA 191 and ISA-18.2, second-hand.
      </footer>
    </section>
  );
}
