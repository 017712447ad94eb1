import {
  comesBackSeconds,
  fleetingSeconds,
  publishedAlertTargets,
  type WireAlertQuality,
} from '@stubpost/shared';
import { PRIORITY_WORDS } from '../../../components/words';
import { formatDuration, formatStamp } from '../../../lib/time-display';
import { count, countedWords, percent, plural } from '../model/quality-words';
import { PlainTable } from './plain-table';
import styles from './quality.module.css';

const duration = (seconds: number | null): string => (seconds === null ? '–' : formatDuration(seconds));

/** Alerts that nobody took. */
export function UntakenPanel({ quality }: { quality: WireAlertQuality }) {
  const { untaken } = quality;
  const { secondsToTake } = untaken;
  return (
    <section className="sp-panel" aria-labelledby="untaken">
      <h2 id="untaken">Untaken</h2>
      <p className={styles.headline}>
        <b>{percent(untaken.share)}</b> taken by nobody
      </p>
      <PlainTable
        caption="Untaken alerts by priority"
        heads={[
          ['Priority', 'words'],
          ['Untaken', 'number'],
          ['Of all of it', 'words'],
        ]}
        rows={[
          ...untaken.byPriority.map((part) => ({
            key: part.priority,
            cells: [PRIORITY_WORDS[part.priority], count(part.count), countedWords(part)],
          })),
          { key: 'all', cells: ['All', count(untaken.count), countedWords(untaken)] },
        ]}
      />
      <dl className={styles.facts}>
        <dt>Half were taken within</dt>
        <dd>{duration(secondsToTake.median)}</dd>
        <dt>95 in 100 within</dt>
        <dd>{duration(secondsToTake.ninetyFifth)}</dd>
      </dl>
      <footer>
        Of alerts that somebody could take: never taken, whatever became of them; one that the crew settles
        before anybody can take it is among them. Times: from raising to the last taking, n ={' '}
        {count(secondsToTake.counted)}. Interval: Wilson, 95 %.
      </footer>
    </section>
  );
}

/** Alerts that come and go. */
export function RepeatersPanel({ quality }: { quality: WireAlertQuality }) {
  const { chattering, cameBack, fleeting } = quality.repeaters;
  const { chatterTimes, chatterSeconds } = publishedAlertTargets;
  return (
    <section className="sp-panel" aria-labelledby="repeaters">
      <h2 id="repeaters">Repeaters</h2>
      <PlainTable
        caption="Alerts that come and go"
        heads={[
          ['What', 'words'],
          ['Here', 'number'],
          ['Target', 'number'],
        ]}
        rows={[
          {
            key: 'chattering',
            cells: [
              `One cause on one turn raised ${chatterTimes} times within ${chatterSeconds} s`,
              count(chattering),
              '0',
            ],
          },
          {
            key: 'came-back',
            cells: [`Raised again within ${comesBackSeconds / 60} min of clearing`, count(cameBack), '0'],
          },
          { key: 'fleeting', cells: [`Gone within ${fleetingSeconds} s, untaken`, count(fleeting), '0'] },
        ]}
      />
      <footer>
        n = {plural(quality.alerts, 'alert')}. First row: EEMUA 191 and ISA-18.2, second-hand. The limits of
        the other two are our choice.
      </footer>
    </section>
  );
}

/** What stands now, and what stood too long. */
export function StandingPanel({ quality, zone }: { quality: WireAlertQuality; zone: string }) {
  const { standing, stale } = quality;
  const { staleHours } = publishedAlertTargets;
  return (
    <section className="sp-panel" aria-labelledby="standing">
      <h2 id="standing">Standing now</h2>
      <p>
        {standing.count === 0
          ? 'Nothing stands.'
          : `${plural(standing.count, 'alert')}, ${count(standing.untaken)} of them untaken. The longest standing first:`}
      </p>
      {standing.count > 0 && (
        <PlainTable
          caption="Alerts that stand now"
          heads={[
            ['Where', 'words'],
            ['What', 'words'],
            ['Since', 'words'],
          ]}
          rows={standing.longest.map(({ id, subject, text, raisedAt, isStale }) => ({
            key: id,
            cells: [
              subject,
              text,
              <>
                {formatStamp(raisedAt, zone)}
                {isStale && <b>, more than {staleHours} h</b>}
              </>,
            ],
          }))}
        />
      )}
      <footer>
        As of {formatStamp(quality.asOf, zone)}, whenever raised. Of the {plural(quality.alerts, 'alert')} of
        these days {count(stale)} stood for more than {staleHours} h. Target: few, and explained; EEMUA 191
        and ISA-18.2, second-hand.
      </footer>
    </section>
  );
}
