import type { CalendarDate, WireTerminalChoice, WireTimetable, WireTimetableHead } from '@stubpost/shared';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { ErrorState, LoadingRows } from '../../../components/page-states';
import { useMay } from '../../../lib/session';
import { differenceQuery, timetableQuery } from '../api/timetable-queries';
import { differenceWords } from '../model/difference-view';
import { draftFrom, terminalsOf, type ActivationDraft } from '../model/terminal-draft';
import { suggestFrom } from '../model/timetable-words';
import { ActivationBar } from './activation-bar';
import { DifferencePanel } from './difference-panel';
import { ImportStages } from './import-stages';
import { ProblemList } from './problem-list';
import { ReadingProgress } from './reading-progress';
import { TerminalChoice } from './terminal-choice';
import { WhatWasRead } from './what-was-read';
import styles from './timetables.module.css';

interface TimetableViewProps {
  id: string;
  today: CalendarDate;
  /** The timetable that runs today, when it is another one. */
  running: WireTimetableHead | undefined;
}

/** One imported timetable, from its reading to its activation. */
export function TimetableView({ id, today, running }: TimetableViewProps) {
  const { data: timetable, error, refetch } = useQuery(timetableQuery(id));
  const known = useQuery({
    ...timetableQuery(running?.id ?? ''),
    enabled: running !== undefined && running.id !== id,
  });
  if (error !== null) return <ErrorState error={error} onRetry={() => void refetch()} />;
  if (timetable === undefined || known.isLoading) {
    return <LoadingRows what="the timetable" onRetry={() => void refetch()} />;
  }
  const terminals = timetable.terminals.length > 0 ? timetable.terminals : (known.data?.terminals ?? []);
  // What somebody has chosen belongs to one reading of one file: a finished reading or an activation begins anew.
  const key = `${timetable.id} ${timetable.state} ${timetable.activeFrom ?? ''}`;
  return <ReadTimetable key={key} {...{ timetable, terminals, today, running }} />;
}

function ReadTimetable({
  timetable,
  terminals,
  today,
  running,
}: Omit<TimetableViewProps, 'id'> & { timetable: WireTimetable; terminals: readonly WireTerminalChoice[] }) {
  const { summary } = timetable;
  const mayImport = useMay('timetables.import');
  const [draft, setDraft] = useState<ActivationDraft>(() => ({
    stations: draftFrom(summary?.stations ?? [], terminals),
    from: summary === null ? today : (timetable.activeFrom ?? suggestFrom(summary, today)),
    acceptGuesses: timetable.acceptGuesses,
  }));
  const onDraft = (change: Partial<ActivationDraft>): void =>
    setDraft((current) => ({ ...current, ...change }));
  const difference = useQuery({
    ...differenceQuery(timetable.id, draft.from ?? today),
    enabled: summary !== null,
  });
  const chosen = draft.stations.filter((row) => row.chosen).length;
  return (
    <>
      <ImportStages timetable={timetable} chosen={chosen} differences={differenceWords(difference.data)} />
      {timetable.state === 'reading' && <ReadingProgress timetable={timetable} />}
      {timetable.state === 'refused' && <ProblemList problems={timetable.problems} />}
      {summary !== null && (
        <>
          <div className={styles.read}>
            <WhatWasRead timetable={timetable} summary={summary} />
            <ProblemList problems={timetable.problems} />
          </div>
          <div className={styles.choose}>
            <TerminalChoice
              summary={summary}
              draft={draft.stations}
              onChange={mayImport ? (stations) => onDraft({ stations }) : undefined}
            />
            <DifferencePanel id={timetable.id} from={draft.from ?? today} zone={summary.zone} />
          </div>
          {mayImport && <ActivationBar {...{ timetable, summary, draft, today, running, onDraft }} />}
        </>
      )}
      <p className="unseen" role="status">
        {timetable.state === 'reading' ? '' : `${terminalsOf(draft.stations).length} terminals chosen`}
      </p>
    </>
  );
}
