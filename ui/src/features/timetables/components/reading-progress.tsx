import { ProgressBar } from '@blueprintjs/core';
import type { WireTimetable } from '@stubpost/shared';
import { formatBytes } from '../model/timetable-words';

/** How far the reading of a file is. Whoever leaves the page misses nothing. */
export function ReadingProgress({ timetable }: { timetable: WireTimetable }) {
  const share = timetable.progress?.share ?? 0;
  const stage = timetable.progress?.stage ?? 'Waiting';
  return (
    <section className="sp-panel" aria-labelledby="reading">
      <header>
        <h2 id="reading">Reading {timetable.fileName}</h2>
        <span className="muted small">{formatBytes(timetable.fileBytes)}</span>
      </header>
      <ProgressBar
        value={share}
        stripes={false}
        animate={false}
        aria-label={`Reading ${timetable.fileName}`}
      />
      <p role="status">
        {stage}, {Math.floor(share * 100)} %. This page may be left meanwhile.
      </p>
    </section>
  );
}
