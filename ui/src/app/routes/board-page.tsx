import type { WireTerminal } from '@stubpost/shared';
import { useEffect } from 'react';
import { useLocation, useNavigate, useParams, useSearchParams } from 'react-router-dom';
import { PageHeader } from '../../components/page-header';
import { EmptyState, ErrorState, LoadingRows } from '../../components/page-states';
import { PartBoundary } from '../../components/part-boundary';
import { AlertStrip } from '../../features/alerts/components/alert-strip';
import { SetAsideDialog } from '../../features/alerts/components/set-aside-dialog';
import { TurnAlertBar } from '../../features/alerts/components/turn-alert-bar';
import { Board } from '../../features/board/components/board';
import { EntryDialog } from '../../features/turn-panel/components/entry-dialog';
import { ReceiptLine } from '../../features/turn-panel/components/receipt-line';
import { TurnPanel } from '../../features/turn-panel/components/turn-panel';
import { errorText } from '../../lib/error-texts';
import { useTerminalChoice } from '../../lib/terminal-choice';
import { useTurnAt } from '../../lib/turn/use-turn-at';
import { useMedia } from '../../lib/use-media';
import styles from './board-page.module.css';
import { boardAddress, fullPageAddress, panelAddress } from './turn-address';
import { useDeskActs } from './use-desk-acts';

const narrow = '(max-width: 900px)';

/** The live board of a terminal; with a turn in the address its panel lies over the board, or it has the whole page. */
export function BoardPage() {
  const { terminal, terminals, isPending, error } = useTerminalChoice();
  const { turnId } = useParams();
  const [query] = useSearchParams();
  if (error !== null) return <ErrorState error={error} />;
  if (isPending) return <LoadingRows what="terminals" />;
  if (turnId !== undefined && query.get('terminal') === null) return <ToOwnTerminal turnId={turnId} />;
  if (terminal === null) {
    const words =
      terminals.length === 0
        ? 'There is no terminal yet.'
        : 'There is no such terminal, or you may not look at it.';
    return <EmptyState words={words} />;
  }
  return <TerminalBoard key={terminal.code} terminal={terminal} />;
}

/** A link that names only the turn: finds out where it is first. */
function ToOwnTerminal({ turnId }: { turnId: string }) {
  const { turn, error, refetch } = useTurnAt(turnId);
  const navigate = useNavigate();
  const [query] = useSearchParams();
  useEffect(() => {
    if (turn === undefined) return;
    const next = new URLSearchParams(query);
    next.set('terminal', turn.terminal);
    void navigate(`/turns/${encodeURIComponent(turn.id)}?${next.toString()}`, { replace: true });
  }, [turn, query, navigate]);
  return error === null ? <LoadingRows what="the turn" /> : <ErrorState error={error} onRetry={refetch} />;
}

function TerminalBoard({ terminal }: { terminal: WireTerminal }) {
  const { turnId } = useParams();
  const navigate = useNavigate();
  const [query] = useSearchParams();
  const state: unknown = useLocation().state;
  const isNarrow = useMedia(narrow);
  const isFull = turnId !== undefined && (isNarrow || query.get('page') === 'full');
  const open = (id: string): void =>
    void navigate(panelAddress(id, terminal.code, query), { replace: turnId !== undefined, state });
  const desk = useDeskActs(terminal);
  const close = (): void => {
    const back = (state as { backTo?: unknown } | null)?.backTo;
    void navigate(typeof back === 'string' ? back : boardAddress(terminal.code, query));
  };

  return (
    <div className={styles.page} data-full={isFull}>
      {!isFull && (
        <>
          <PageHeader hidden title={`Board, ${terminal.name}`} />
          <PartBoundary part="This strip" rest="The board is fine.">
            <AlertStrip terminal={terminal} isHalf={turnId !== undefined} onOpen={open} />
          </PartBoundary>
          <Board
            terminal={terminal}
            openId={turnId ?? null}
            hasPicture={!isNarrow}
            onOpen={open}
            onAct={desk.onBoard}
          />
        </>
      )}
      {isFull && <PageHeader hidden title="Turn" />}
      {turnId !== undefined && (
        <PartBoundary key={turnId} part="This panel" rest="The board is fine.">
          <TurnPanel
            turnId={turnId}
            terminal={terminal}
            isPage={isFull}
            alerts={(turn) => <TurnAlertBar turn={turn} onSetAside={desk.onSetAside} />}
            onAct={desk.onEntry}
            onRecorded={desk.onRecorded}
            onFullPage={() => void navigate(fullPageAddress(turnId, terminal.code), { state })}
            onClose={close}
          />
        </PartBoundary>
      )}
      <EntryDialog target={desk.target} onClose={desk.close} onRecorded={desk.onRecorded} />
      <SetAsideDialog alert={desk.aside} zone={terminal.zone} onClose={desk.close} />
      {desk.problem !== null && (
        <p className={styles.problem} role="alert">
          {errorText(desk.problem)}
        </p>
      )}
      {desk.recorded !== null && (
        <ReceiptLine key={desk.recorded.entryId} recorded={desk.recorded} onClose={desk.closeReceipt} />
      )}
    </div>
  );
}
