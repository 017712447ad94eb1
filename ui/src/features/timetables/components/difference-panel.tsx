import { FormGroup, HTMLSelect } from '@blueprintjs/core';
import type { CalendarDate, WireTimetableDifference } from '@stubpost/shared';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { ErrorState, LoadingRows } from '../../../components/page-states';
import { formatServiceDate } from '../../../lib/time-display';
import { differenceQuery } from '../api/timetable-queries';
import {
  changedTurns,
  countsByDate,
  dateToShow,
  greatestLosses,
  type DateCounts,
} from '../model/difference-view';
import { formatCount, shortName } from '../model/timetable-words';
import { LayoverChanges } from './layover-changes';
import { TurnDifferences } from './turn-differences';
import styles from './timetables.module.css';

/** Turns drawn in the picture of layovers before and after. */
const turnsDrawn = 6;

/** What a timetable changes against the one that runs, in the week from the chosen day on. */
export function DifferencePanel({ id, from, zone }: { id: string; from: CalendarDate; zone: string }) {
  const { data, error, refetch } = useQuery(differenceQuery(id, from));
  return (
    <section className="sp-panel" aria-labelledby="differences">
      <header>
        <h2 id="differences">Differences to the running timetable</h2>
        {data?.against && <span className="muted small">{shortName(data.against.fileName)}</span>}
      </header>
      {error !== null && <ErrorState error={error} onRetry={() => void refetch()} />}
      {data === undefined && error === null && (
        <LoadingRows what="differences" onRetry={() => void refetch()} />
      )}
      {data?.against === null && <p>No other timetable runs then. There is nothing to compare with.</p>}
      {data !== undefined && data.against !== null && <Compared difference={data} zone={zone} />}
    </section>
  );
}

function Compared({ difference, zone }: { difference: WireTimetableDifference; zone: string }) {
  const counts = countsByDate(difference);
  const [picked, setPicked] = useState<CalendarDate | null>(null);
  const shown = counts.find(({ serviceDate }) => serviceDate === picked) ?? dateToShow(counts);
  if (shown === undefined) return <p>No turns at the terminals of the running timetable in this week.</p>;
  const turns = difference.turns.filter(({ serviceDate }) => serviceDate === shown.serviceDate);
  return (
    <>
      <div className={styles.counts}>
        <FormGroup label="Service date" labelFor="compared-date">
          <HTMLSelect
            id="compared-date"
            value={shown.serviceDate}
            onChange={(event) => setPicked(event.currentTarget.value)}
            options={counts.map((each) => ({ value: each.serviceDate, label: optionWords(each) }))}
          />
        </FormGroup>
        <Counts counts={shown} />
      </div>
      {shown.againstDate !== null && shown.againstDate !== shown.serviceDate && (
        <p className="muted">
          The running timetable does not reach so far. Compared with {formatServiceDate(shown.againstDate)}.
        </p>
      )}
      <LayoverChanges changes={greatestLosses(turns, turnsDrawn)} zone={zone} />
      <TurnDifferences turns={turns} zone={zone} />
    </>
  );
}

function optionWords(counts: DateCounts): string {
  const changed = changedTurns(counts);
  return `${formatServiceDate(counts.serviceDate)}: ${changed === 0 ? 'no change' : `${formatCount(changed)} differ`}`;
}

function Counts({ counts }: { counts: DateCounts }) {
  const parts = [
    [counts.same, 'the same'],
    [counts.moved, 'moved'],
    [counts.added, 'added'],
    [counts.removed, 'removed'],
  ] as const;
  return (
    <p className={styles.countWords}>
      {parts.map(([count, word]) => (
        <span key={word}>
          <b>{formatCount(count)}</b> {word}
        </span>
      ))}
    </p>
  );
}
