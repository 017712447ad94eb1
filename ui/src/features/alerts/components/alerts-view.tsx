import { SegmentedControl } from '@blueprintjs/core';
import type { WireAlert, WireTerminal } from '@stubpost/shared';
import { useQuery } from '@tanstack/react-query';
import { useId, useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import { EmptyState, ErrorState, LoadingRows } from '../../../components/page-states';
import { errorText } from '../../../lib/error-texts';
import { useMay, usePerson } from '../../../lib/session';
import { standingAlertsQuery } from '../../../lib/standing-alerts';
import { dateAt } from '../../../lib/time-display';
import { useNow } from '../../../lib/use-now';
import { useTakeAlert } from '../api/alert-acts';
import { alertsQuery } from '../api/alert-queries';
import { groupAlerts, SHOWN, type Shown } from '../model/group-alerts';
import { AlertList } from './alert-list';
import { AlertSide } from './alert-side';
import styles from './alerts-view.module.css';

export interface AlertsViewProps {
  terminal: WireTerminal;
  onOpen: (turnId: string) => void;
}

/** Alerts of a terminal: the list, and beside it the picked one. */
export function AlertsView({ terminal, onOpen }: AlertsViewProps) {
  const found = useAlerts(terminal);
  const me = usePerson().name;
  const mayAct = useMay('alerts.act', terminal.code);
  const take = useTakeAlert();
  const formId = useId();
  const [query, setQuery] = useSearchParams();
  const [chosenId, setChosenId] = useState<string | null>(null);
  const shown = SHOWN.find((one) => one === query.get('show')) ?? 'all';
  const isMine = query.get('who') === 'mine';
  const alerts = found.alerts.filter((alert) => !isMine || alert.takenBy === me);
  const groups = groupAlerts(alerts, shown);
  const listed = groups.flatMap((group) => group.alerts);
  const picked = listed.find((alert) => alert.id === chosenId) ?? listed[0] ?? null;

  const set = (name: string, value: string | null): void => {
    const next = new URLSearchParams(query);
    if (value === null) next.delete(name);
    else next.set(name, value);
    setQuery(next, { replace: true });
  };
  const toForm = (alert: WireAlert): void => {
    setChosenId(alert.id);
    requestAnimationFrame(() => document.getElementById(formId)?.focus());
  };

  return (
    <>
      <AlertTools found={found.alerts} shown={shown} isMine={isMine} onSet={set} />
      {take.error !== null && (
        <p className={styles.problem} role="alert">
          {errorText(take.error)}
        </p>
      )}
      <div className={styles.page}>
        <section className={styles.list} aria-label="Alerts">
          {found.error !== null && <ErrorState error={found.error} onRetry={found.retry} />}
          {found.isPending && <LoadingRows what="alerts" rowHeight={72} onRetry={found.retry} />}
          {!found.isPending && found.error === null && listed.length === 0 && (
            <EmptyState words={isMine ? 'You have no alert here.' : 'No alert here.'} />
          )}
          {listed.length > 0 && (
            <AlertList
              groups={groups}
              zone={terminal.zone}
              me={me}
              mayAct={mayAct}
              pickedId={picked?.id ?? null}
              onPick={(alert) => setChosenId(alert.id)}
              onTake={(alert) => take.mutate(alert)}
              onOpen={(alert) => alert.turnId !== null && onOpen(alert.turnId)}
              onForm={toForm}
            />
          )}
        </section>
        {picked !== null && (
          <aside className={styles.side} aria-label="Picked alert">
            <AlertSide
              alert={picked}
              zone={terminal.zone}
              me={me}
              mayAct={mayAct}
              isTaking={take.isPending}
              formId={formId}
              onTake={() => take.mutate(picked)}
              onOpen={onOpen}
            />
          </aside>
        )}
      </div>
    </>
  );
}

interface AlertToolsProps {
  found: readonly WireAlert[];
  shown: Shown;
  isMine: boolean;
  onSet: (name: string, value: string | null) => void;
}

function AlertTools({ found, shown, isMine, onSet }: AlertToolsProps) {
  const count = (which: Shown): number => groupAlerts(found, which).flatMap((group) => group.alerts).length;
  return (
    <div className={styles.tools} role="group" aria-label="Which alerts">
      <SegmentedControl
        aria-label="State"
        value={shown}
        onValueChange={(value) => onSet('show', value === 'all' ? null : value)}
        options={[
          { label: 'All', value: 'all' },
          { label: `Standing, ${count('standing')}`, value: 'standing' },
          { label: `Waiting for a cause, ${count('waiting')}`, value: 'waiting' },
          { label: `Closed today, ${count('closed')}`, value: 'closed' },
        ]}
      />
      <SegmentedControl
        aria-label="Whose"
        value={isMine ? 'mine' : 'all'}
        onValueChange={(value) => onSet('who', value === 'mine' ? 'mine' : null)}
        options={[
          { label: 'Everybody’s', value: 'all' },
          { label: 'Mine', value: 'mine' },
        ]}
      />
    </div>
  );
}

/** What stands, what waits for its cause, and what was closed today. */
function useAlerts({ code, zone }: WireTerminal) {
  const standing = useQuery(standingAlertsQuery(code));
  const cleared = useQuery(alertsQuery(code, 'cleared'));
  const closed = useQuery(alertsQuery(code, 'closed'));
  const today = dateAt(useNow(60), zone);
  const all = [standing, cleared, closed];
  return {
    alerts: [
      ...(standing.data ?? []),
      ...(cleared.data ?? []),
      ...(closed.data ?? []).filter(
        (alert) => alert.closedAt !== null && dateAt(alert.closedAt, zone) === today,
      ),
    ],
    isPending: standing.isPending,
    error: standing.data === undefined ? standing.error : null,
    retry: () => all.forEach((query) => void query.refetch()),
  };
}
