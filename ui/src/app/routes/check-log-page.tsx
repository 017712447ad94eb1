import { useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import { PageHeader } from '../../components/page-header';
import { CheckLogView } from '../../features/records/components/check-log-view';
import { readLogDays, writeLogDay } from '../../features/records/model/log-days';
import { useTerminalChoice } from '../../lib/terminal-choice';
import { readNow } from '../../lib/use-now';

/** Whether the sealed log is whole, and how to check that without trusting this server. */
export function CheckLogPage() {
  const { terminal } = useTerminalChoice();
  const [search, setSearch] = useSearchParams();
  const [openedAt] = useState(readNow);
  const zone = terminal?.zone ?? Intl.DateTimeFormat().resolvedOptions().timeZone;
  return (
    <div className="sp-page">
      <PageHeader title="Check the log">
        <span className="muted">All terminals: there is one log.</span>
      </PageHeader>
      <CheckLogView
        zone={zone}
        days={readLogDays(search, openedAt)}
        onDay={(name, day) => setSearch((current) => writeLogDay(current, name, day), { replace: true })}
      />
    </div>
  );
}
