import { useQuery } from '@tanstack/react-query';
import { may, type WireTerminal } from '@stubpost/shared';
import { useState } from 'react';
import { PageHeader } from '../../components/page-header';
import { EmptyState, ErrorState, LoadingRows } from '../../components/page-states';
import { rosterQuery } from '../../features/duty/api/roster';
import { RosterForm } from '../../features/duty/components/roster-form';
import { usePerson } from '../../lib/session';
import { useTerminalChoice } from '../../lib/terminal-choice';

function Roster({ terminal }: { terminal: WireTerminal }) {
  const person = usePerson();
  const { data, error, refetch } = useQuery(rosterQuery(terminal.code));
  const [isSaved, setSaved] = useState(false);
  if (error !== null) return <ErrorState error={error} onRetry={() => void refetch()} />;
  if (data === undefined) return <LoadingRows what="the roster" onRetry={() => void refetch()} />;
  return (
    <>
      {isSaved && <p role="status">Saved.</p>}
      <RosterForm
        key={data.version}
        roster={data}
        mayEdit={may(person, 'roster.edit', terminal.code)}
        onSaved={() => setSaved(true)}
      />
    </>
  );
}

/** Who is on the desk when, and who is told when nobody takes an alert. */
export function RosterPage() {
  const { terminal, isPending, error } = useTerminalChoice();
  return (
    <div className="sp-page">
      <PageHeader title={terminal === null ? 'Roster' : `Roster, ${terminal.name}`} />
      {error !== null && <ErrorState error={error} />}
      {isPending && <LoadingRows what="terminals" />}
      {!isPending && error === null && terminal === null && (
        <EmptyState words="There is no terminal here that you may look at." />
      )}
      {terminal !== null && <Roster key={terminal.code} terminal={terminal} />}
    </div>
  );
}
