import { Button, HTMLTable } from '@blueprintjs/core';
import type { WireDailyHead } from '@stubpost/shared';
import { useState } from 'react';
import { formatServiceDateWithYear, formatStamp } from '../../../lib/time-display';
import { formatCount, numbersOfDay, shortHash } from '../model/log-words';
import styles from './check-log.module.css';

const usuallyShown = 10;

function HeadRow({ head, zone }: { head: WireDailyHead; zone: string }) {
  return (
    <tr>
      <th scope="row" className="nowrap">
        {formatServiceDateWithYear(head.date)}
        <span className={styles.numbers}>{numbersOfDay(head)}</span>
      </th>
      <td>
        <b className={styles.short}>{shortHash(head.hash)}</b>
        <code className={styles.full}>
          {head.hash}@{head.sequence}
        </code>
      </td>
      <td>{head.publishedAt === null ? 'still running, moves on' : formatStamp(head.publishedAt, zone)}</td>
    </tr>
  );
}

/** The heads of the days, newest first. */
export function DailyHeads({ heads, zone }: { heads: readonly WireDailyHead[]; zone: string }) {
  const [isAll, setAll] = useState(false);
  const newestFirst = [...heads].reverse();
  const shown = isAll ? newestFirst : newestFirst.slice(0, usuallyShown);
  return (
    <section className="sp-panel" aria-labelledby="daily-heads">
      <h2 id="daily-heads">Daily heads</h2>
      {heads.length === 0 ? (
        <p>No day has an entry yet.</p>
      ) : (
        <div className="sp-table-scroll" tabIndex={0} role="region" aria-label="Table of daily heads">
          <HTMLTable className={`sp-table ${styles.heads}`}>
            <thead>
              <tr>
                <th scope="col">Day of receipt, UTC</th>
                <th scope="col">Head</th>
                <th scope="col">Published</th>
              </tr>
            </thead>
            <tbody>
              {shown.map((head) => (
                <HeadRow key={head.date} head={head} zone={zone} />
              ))}
            </tbody>
          </HTMLTable>
        </div>
      )}
      {newestFirst.length > shown.length && (
        <div className="sp-actions">
          <Button onClick={() => setAll(true)}>Show all {formatCount(newestFirst.length)}</Button>
        </div>
      )}
      <footer>
        A head is the hash of the last entry of a day: its first 12 characters, then all of it with the number
        of the entry. It is published at 00:05 UTC on the next day and never changes. Kept outside this
        server, on paper or in a mail box, it proves later that nothing up to it was changed, added or taken
        out.
      </footer>
    </section>
  );
}
