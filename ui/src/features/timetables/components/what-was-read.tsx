import type { WireTimetable, WireTimetableSummary } from '@stubpost/shared';
import { formatServiceDate } from '../../../lib/time-display';
import { formatBytes, formatCount, formatDays } from '../model/timetable-words';
import styles from './timetables.module.css';

function turnWords({ turns, guessedTurns }: WireTimetableSummary): string {
  const guesses = guessedTurns === 0 ? 'none guessed' : `${formatCount(guessedTurns)} more guessed`;
  return `${formatCount(turns)}, ${guesses}`;
}

function busiestWords({ busiestDate, stations }: WireTimetableSummary): string {
  if (busiestDate === null) return 'none';
  const turning = stations.filter(({ turnsOnBusiestDay }) => turnsOnBusiestDay > 0);
  const turns = turning.reduce((sum, { turnsOnBusiestDay }) => sum + turnsOnBusiestDay, 0);
  const places = turning.length === 1 ? 'station' : 'stations';
  return `${formatCount(turns)} at ${turning.length} ${places}, ${formatServiceDate(busiestDate)}`;
}

/** What a timetable holds, in five lines. */
export function WhatWasRead({
  timetable,
  summary,
}: {
  timetable: WireTimetable;
  summary: WireTimetableSummary;
}) {
  const lines = [
    ['Days', formatDays(summary.firstDate, summary.lastDate)],
    ['Trains', `${formatCount(summary.trips)} trips, ${formatCount(summary.blocks)} blocks`],
    ['Turns, all days', turnWords(summary)],
    ['Turns, busiest day', busiestWords(summary)],
    ['Agency, zone', [summary.agency, summary.zone].filter((part) => part !== '').join(', ')],
  ] as const;
  return (
    <section className="sp-panel" aria-labelledby="what-was-read">
      <header>
        <h2 id="what-was-read">What was read</h2>
        <span className="muted small">
          {timetable.fileName}, {formatBytes(timetable.fileBytes)}
        </span>
      </header>
      <table className={`sp-table ${styles.facts}`}>
        <tbody>
          {lines.map(([name, value]) => (
            <tr key={name}>
              <th scope="row">{name}</th>
              <td className="number">{value}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  );
}
