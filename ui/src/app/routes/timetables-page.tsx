import '@blueprintjs/datetime/lib/css/blueprint-datetime.css';
import '@blueprintjs/datetime2/lib/css/blueprint-datetime2.css';

import { Button } from '@blueprintjs/core';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate, useParams } from 'react-router-dom';
import { PageHeader } from '../../components/page-header';
import { EmptyState, ErrorState, LoadingRows } from '../../components/page-states';
import { PartBoundary } from '../../components/part-boundary';
import { timetablesQuery } from '../../features/timetables/api/timetable-queries';
import { AllTimetables } from '../../features/timetables/components/all-timetables';
import { BringInPanel } from '../../features/timetables/components/bring-in-panel';
import { TimetableView } from '../../features/timetables/components/timetable-view';
import { TimetableViews } from '../../features/timetables/components/timetable-views';
import { firstToShow, runningOn } from '../../features/timetables/model/timetable-words';
import { useMay } from '../../lib/session';
import { useTerminalChoice } from '../../lib/terminal-choice';
import { dateAt } from '../../lib/time-display';
import { useNow } from '../../lib/use-now';

/** Timetables: brought in, looked through, made active and taken back. */
export function TimetablesPage() {
  const { data: heads, error, refetch } = useQuery(timetablesQuery);
  const { terminal } = useTerminalChoice();
  const zone = terminal?.zone ?? Intl.DateTimeFormat().resolvedOptions().timeZone;
  const today = dateAt(useNow(60), zone);
  const mayImport = useMay('timetables.import');
  const [isBringing, setBringing] = useState(false);
  const navigate = useNavigate();
  const named = useParams()['*'];
  if (error !== null) return <ErrorState error={error} onRetry={() => void refetch()} />;
  if (heads === undefined) return <LoadingRows what="timetables" onRetry={() => void refetch()} />;
  const shownId = named === undefined || named === '' ? firstToShow(heads, today)?.id : named;
  const isFormOpen = mayImport && (isBringing || heads.length === 0);
  return (
    <div className="sp-page">
      <PageHeader title="Timetables">
        <TimetableViews heads={heads} shownId={shownId} today={today} />
        {mayImport && !isFormOpen && <Button onClick={() => setBringing(true)}>Bring in another file</Button>}
      </PageHeader>
      {isFormOpen && (
        <BringInPanel
          onSent={(id) => {
            setBringing(false);
            void navigate(`/timetables/${id}`);
          }}
          onClose={heads.length === 0 ? undefined : () => setBringing(false)}
        />
      )}
      {heads.length === 0 && !mayImport && (
        <EmptyState words="No timetable has been brought in yet. The administrator can do that here." />
      )}
      {shownId !== undefined && (
        <PartBoundary part="This timetable" rest="The running one is fine.">
          <TimetableView key={shownId} id={shownId} today={today} running={runningOn(heads, today)} />
        </PartBoundary>
      )}
      {heads.length > 0 && <AllTimetables heads={heads} today={today} zone={zone} />}
    </div>
  );
}
