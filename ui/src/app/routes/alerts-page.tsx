import { useLocation, useNavigate } from 'react-router-dom';
import { PageHeader } from '../../components/page-header';
import { EmptyState, ErrorState, LoadingRows } from '../../components/page-states';
import { AlertsView } from '../../features/alerts/components/alerts-view';
import { useTerminalChoice } from '../../lib/terminal-choice';
import { AlertPages } from './alert-pages';
import { panelAddress } from './turn-address';
import styles from './alert-pages.module.css';

/** Alerts of the chosen terminal. */
export function AlertsPage() {
  const { terminal, isPending, error } = useTerminalChoice();
  const navigate = useNavigate();
  const { pathname, search } = useLocation();
  if (error !== null) return <ErrorState error={error} />;
  if (isPending) return <LoadingRows what="terminals" />;
  if (terminal === null) return <EmptyState words="There is no terminal here that you may look at." />;
  return (
    <>
      <PageHeader hidden title={`Alerts, ${terminal.name}`} />
      <div className={styles.bar}>
        <AlertPages />
      </div>
      <AlertsView
        terminal={terminal}
        onOpen={(turnId) =>
          void navigate(panelAddress(turnId, terminal.code, new URLSearchParams()), {
            state: { backTo: `${pathname}${search}` },
          })
        }
      />
    </>
  );
}
