import type { MessageChannel } from '@stubpost/shared';
import { useQuery } from '@tanstack/react-query';
import { PageHeader } from '../../components/page-header';
import { ErrorState, LoadingRows } from '../../components/page-states';
import { messagesQuery } from '../../features/messages/api/messages';
import { LocalBoxes } from '../../features/messages/components/local-boxes';
import { MessageLog } from '../../features/messages/components/message-log';
import { CHANNEL_WORDS } from '../../features/messages/components/message-words';
import { useTerminalChoice } from '../../lib/terminal-choice';
import styles from './columns.module.css';

/** "E-mail and text message". */
function localWords(channels: readonly MessageChannel[]): string {
  const words = channels.map((channel) => CHANNEL_WORDS[channel]).join(' and ');
  return words.charAt(0) + words.slice(1).toLowerCase();
}

/** What went out by mail and text message, and the boxes it ends in while no real service is set up. */
export function BoxesPage() {
  const { data, error, refetch } = useQuery(messagesQuery);
  const { terminal } = useTerminalChoice();
  const zone = terminal?.zone ?? Intl.DateTimeFormat().resolvedOptions().timeZone;
  return (
    <div className="sp-page">
      <PageHeader title="Messages" />
      {error !== null && <ErrorState error={error} onRetry={() => void refetch()} />}
      {data === undefined && error === null && <LoadingRows what="messages" onRetry={() => void refetch()} />}
      {data !== undefined && (
        <div className={styles.stack}>
          {data.local.length > 0 && (
            <section className="sp-panel" aria-labelledby="boxes">
              <header>
                <h2 id="boxes">Local boxes</h2>
                <span className="muted">
                  {localWords(data.local)}: no service is set up, so messages end here and reach nobody
                </span>
              </header>
              <LocalBoxes items={data.items} zone={zone} />
            </section>
          )}
          <section className="sp-panel" aria-labelledby="outgoing">
            <header>
              <h2 id="outgoing">Outgoing messages</h2>
              <span className="muted">The newest 200, each with its last tries</span>
            </header>
            <MessageLog messages={data.messages} zone={zone} />
          </section>
        </div>
      )}
    </div>
  );
}
