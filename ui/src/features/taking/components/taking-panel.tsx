import { Button } from '@blueprintjs/core';
import type { WireTaking } from '@stubpost/shared';
import { PriorityMark } from '../../../components/flags';
import { errorText } from '../../../lib/error-texts';
import { formatClock, formatStamp, formatTime } from '../../../lib/time-display';
import { useTake } from '../api/taking';
import styles from './taking-panel.module.css';

/** How it stands with the alert, before or after the button. */
function Standing({ taking, isMine }: { taking: WireTaking; isMine: boolean }) {
  const { takenBy, takenAt, clearedAt, zone } = taking;
  return (
    <>
      {isMine && takenAt !== null && (
        <p role="status" className={styles.taken}>
          <b>
            Taken by {taking.name} at {formatClock(takenAt, zone)}.
          </b>{' '}
          The desk sees it. You may close this page.
        </p>
      )}
      {!isMine && takenBy !== null && takenAt !== null && (
        <p>
          {takenBy} has it since {formatClock(takenAt, zone)}. Taking it makes it yours.
        </p>
      )}
      {clearedAt !== null && <p>Cleared at {formatClock(clearedAt, zone)}: the condition is over.</p>}
    </>
  );
}

/** An alert that came by message, with the one button that takes it. */
export function TakingPanel({ token, taking: first }: { token: string; taking: WireTaking }) {
  const take = useTake(token);
  const taking = take.data ?? first;
  const { zone } = taking;
  return (
    <section className="sp-panel" aria-labelledby="taking">
      <header>
        <PriorityMark priority={taking.priority} over={taking.clearedAt !== null} />
        <h2 id="taking">
          {taking.terminal}, {taking.subject}
        </h2>
      </header>
      <p className={styles.fact}>{taking.text}.</p>
      <dl className={styles.facts}>
        <dt>Since</dt>
        <dd>{formatStamp(taking.raisedAt, zone)}</dd>
        <dt>To do</dt>
        <dd>{taking.action}</dd>
      </dl>
      <Standing taking={taking} isMine={take.isSuccess} />
      {take.isError && (
        <p className="sp-problems" role="alert">
          {errorText(take.error)}
        </p>
      )}
      {!take.isSuccess && (
        <>
          <Button
            className={styles.button ?? ''}
            intent="primary"
            fill
            loading={take.isPending}
            onClick={() => take.mutate()}
          >
            Take it as {taking.name}
          </Button>
          <p className="muted small">
            Works once, for {taking.name}, until {formatTime(taking.expiresAt, zone)}. Opening this page has
            changed nothing.
          </p>
        </>
      )}
    </section>
  );
}
