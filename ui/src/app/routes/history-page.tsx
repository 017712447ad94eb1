import '@blueprintjs/datetime/lib/css/blueprint-datetime.css';
import '@blueprintjs/datetime2/lib/css/blueprint-datetime2.css';

import { useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import { EmptyState, ErrorState, LoadingRows } from '../../components/page-states';
import { PageHeader } from '../../components/page-header';
import { PartBoundary } from '../../components/part-boundary';
import { DeparturesPanel } from '../../features/history/components/departures-panel';
import { ImportPanel } from '../../features/history/components/import-panel';
import { OnTimeView } from '../../features/history/components/on-time-view';
import { RuleFields } from '../../features/history/components/rule-fields';
import { readHistorySearch, writeHistorySearch } from '../../features/history/model/history-search';
import { useMay } from '../../lib/session';
import { useTerminalChoice } from '../../lib/terminal-choice';
import { readNow } from '../../lib/use-now';

/** How many trains of the chosen terminal left on time, and the departures that say so. */
export function HistoryPage() {
  const { terminal, isPending, error } = useTerminalChoice();
  const [search, setSearch] = useSearchParams();
  const [openedAt] = useState(readNow);
  const mayLoad = useMay('history.import');
  if (error !== null) return <ErrorState error={error} />;
  if (isPending) return <LoadingRows what="terminals" />;
  if (terminal === null)
    return <EmptyState words="There is no terminal yet. A timetable brings the first one." />;
  const asked = readHistorySearch(search, openedAt, terminal.zone);
  return (
    <div className="sp-page">
      <PageHeader title="On-time departure">
        <span className="muted">{terminal.name}</span>
      </PageHeader>
      <RuleFields
        search={asked}
        onChange={(next) => setSearch((current) => writeHistorySearch(current, next), { replace: true })}
      />
      <PartBoundary part="This report" rest="The other pages are fine.">
        <OnTimeView terminal={terminal.code} search={asked} />
      </PartBoundary>
      <DeparturesPanel terminal={terminal.code} zone={terminal.zone} search={asked} />
      {mayLoad && <ImportPanel />}
    </div>
  );
}
