import type { OnTimeAnswer } from '@stubpost/shared';
import { formatLateness } from '../../../lib/time-display';
import { fewDepartures, formatCount, formatInterval, formatPercent, remarksOn } from '../model/figures-text';
import styles from './history.module.css';

/** A delay of the distribution in words; quantiles fall between whole seconds, so they are rounded here only. */
const lateness = (seconds: number | null): string =>
  seconds === null ? '–' : formatLateness(Math.round(seconds));

/** The share with its counts, its interval and the rule that made it. */
export function Headline({ answer }: { answer: OnTimeAnswer }) {
  const remarks = remarksOn(answer);
  return (
    <section className="sp-panel" aria-labelledby="headline">
      <h2 id="headline" className="unseen">
        Left on time
      </h2>
      <p className={styles.headline}>
        <b>{formatPercent(answer.share)} %</b> left on time
      </p>
      <p>
        {formatCount(answer.onTime)} of {formatCount(answer.counted)} departures, interval{' '}
        {formatInterval(answer)}.
        {answer.counted < fewDepartures && ' Few departures: the interval says how little is known.'}
      </p>
      <dl className={styles.delays}>
        <dt>Half left within</dt>
        <dd>{lateness(answer.delaySeconds.p50)}</dd>
        <dt>8 in 10 within</dt>
        <dd>{lateness(answer.delaySeconds.p80)}</dd>
        <dt>95 in 100 within</dt>
        <dd>{lateness(answer.delaySeconds.p95)}</dd>
        <dt>Mean</dt>
        <dd>{lateness(answer.delaySeconds.mean)}</dd>
      </dl>
      <footer>
        <p>
          On time: {answer.rule.name}. Measured at the {answer.rule.point}, in whole seconds after the
          scheduled time; a hold does not move it. {remarks === null ? '' : `Not in the share: ${remarks}. `}
          Interval: Wilson, 95 %. Delays: quantiles of type 7, early as less than nothing.
        </p>
        <p>
          Arrival at the far end within 5:59 is another measure; it is not made here and must not be compared.
        </p>
      </footer>
    </section>
  );
}
