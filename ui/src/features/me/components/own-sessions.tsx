import { Button } from '@blueprintjs/core';
import type { OwnSession } from '@stubpost/shared';
import { useQuery } from '@tanstack/react-query';
import { ErrorState, LoadingRows } from '../../../components/page-states';
import { errorText } from '../../../lib/error-texts';
import { formatSince, formatStamp } from '../../../lib/time-display';
import { useNow } from '../../../lib/use-now';
import { deviceWords } from '../model/device-words';
import { ownSessionsQuery, useEndOwnSession } from '../api/own-sign-in';

interface RowProps {
  session: OwnSession;
  zone: string;
  now: number;
  onEnd: (sessionId: string) => void;
  isBusy: boolean;
}

function SessionRow({ session, zone, now, onEnd, isBusy }: RowProps) {
  return (
    <tr>
      <th scope="row" title={session.device}>
        {deviceWords(session.device)}
      </th>
      <td data-head="Since">{formatStamp(session.startedAt, zone)}</td>
      <td data-head="Last seen" className="nowrap">
        {session.current ? 'now' : formatSince(session.lastSeenAt, now)}
      </td>
      <td className="number">
        {session.current ? (
          <span className="muted nowrap">this one</span>
        ) : (
          <Button
            disabled={isBusy}
            onClick={() => onEnd(session.id)}
            aria-label={`End the session on ${deviceWords(session.device)} since ${formatStamp(session.startedAt, zone)}`}
          >
            End
          </Button>
        )}
      </td>
    </tr>
  );
}

/** Where one is signed in, and the way to end it from here: a lost phone, a desk left open. */
export function OwnSessions({ zone }: { zone: string }) {
  const { data, error, refetch } = useQuery(ownSessionsQuery);
  const end = useEndOwnSession();
  const now = useNow(10);
  return (
    <section className="sp-panel" aria-labelledby="own-sessions">
      <header>
        <h2 id="own-sessions">Signed in on</h2>
      </header>
      {end.isError && (
        <p className="sp-problems" role="alert">
          {errorText(end.error)}
        </p>
      )}
      {error !== null && <ErrorState error={error} onRetry={() => void refetch()} />}
      {data === undefined && error === null && <LoadingRows what="your sessions" rows={2} />}
      {data !== undefined && (
        <div className="sp-table-scroll" role="region" aria-label="Sessions" tabIndex={0}>
          <table className="sp-table sp-stack">
            <thead>
              <tr>
                <th scope="col">Device</th>
                <th scope="col">Since</th>
                <th scope="col">Last seen</th>
                <th scope="col">
                  <span className="unseen">End</span>
                </th>
              </tr>
            </thead>
            <tbody>
              {data.map((session) => (
                <SessionRow
                  key={session.id}
                  session={session}
                  zone={zone}
                  now={now}
                  isBusy={end.isPending}
                  onEnd={(sessionId) => end.mutate(sessionId)}
                />
              ))}
            </tbody>
          </table>
        </div>
      )}
      <footer>A session that is ended here is over on its device within a minute.</footer>
    </section>
  );
}
