import type { WireTerminal } from '@stubpost/shared';
import { useNavigate, useParams } from 'react-router-dom';
import { PageHeader } from '../../components/page-header';
import { EmptyState, ErrorState, LoadingRows } from '../../components/page-states';
import { Board } from '../../features/board/components/board';
import { useTerminalChoice } from '../../lib/terminal-choice';
import styles from './board-page.module.css';

/** The live board of a terminal; with a turn in the address its panel lies over the board. */
export function BoardPage() {
  const { terminal, isPending, error } = useTerminalChoice();
  if (error !== null) return <ErrorState error={error} />;
  if (isPending) return <LoadingRows what="terminals" />;
  if (terminal === null) return <EmptyState words="There is no terminal here that you may look at." />;
  return <TerminalBoard terminal={terminal} />;
}

function TerminalBoard({ terminal }: { terminal: WireTerminal }) {
  const { turnId } = useParams();
  const navigate = useNavigate();
  return (
    <div className={styles.page}>
      <PageHeader hidden title={`Board, ${terminal.name}`} />
      <Board
        terminal={terminal}
        openId={turnId ?? null}
        hasPicture
        onAct={(_act, turn) => void navigate(`/turns/${turn.id}?terminal=${terminal.code}`)}
      />
    </div>
  );
}
