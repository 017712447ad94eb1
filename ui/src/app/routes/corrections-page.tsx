import { useLocation, useNavigate } from 'react-router-dom';
import { PageHeader } from '../../components/page-header';
import { EmptyState, ErrorState, LoadingRows } from '../../components/page-states';
import { CorrectionsView } from '../../features/records/components/corrections-view';
import { useTerminalChoice } from '../../lib/terminal-choice';
import { panelAddress } from './turn-address';

/** Corrections of the chosen terminal. */
export function CorrectionsPage() {
  const { terminal, isPending, error } = useTerminalChoice();
  const navigate = useNavigate();
  const { pathname, search } = useLocation();
  if (error !== null) return <ErrorState error={error} />;
  if (isPending) return <LoadingRows what="terminals" />;
  if (terminal === null) return <EmptyState words="There is no terminal here that you may look at." />;
  return (
    <div className="sp-page">
      <PageHeader title="Corrections">
        <span className="muted">{terminal.name}</span>
      </PageHeader>
      <CorrectionsView
        key={terminal.code}
        terminal={terminal}
        onOpen={(turnId) =>
          void navigate(panelAddress(turnId, terminal.code, new URLSearchParams()), {
            state: { backTo: `${pathname}${search}` },
          })
        }
      />
    </div>
  );
}
