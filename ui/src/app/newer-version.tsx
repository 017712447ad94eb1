import { Button } from '@blueprintjs/core';
import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useSyncExternalStore } from 'react';
import { loadNewerVersion, useNewerVersion } from '../lib/app-version';
import { outboxOf } from '../lib/outbox/use-outbox';
import { useSession } from '../lib/session';
import { hasUnsaved, onUnsavedChange } from '../lib/unsaved';
import styles from './shell.module.css';

const nothingToWatch = (): (() => void) => () => undefined;

/** How many entries of the person signed in are not sent. */
function useUnsent(): number {
  const client = useQueryClient();
  const { person } = useSession();
  const outbox = person === null ? null : outboxOf(client, person.id);
  return useSyncExternalStore(
    outbox?.subscribe ?? nothingToWatch,
    () => outbox?.getState().waiting.filter(({ refusal }) => refusal === null).length ?? 0,
  );
}

/**
 * Says that a newer version waits. It loads at a touch, or by itself once the page goes out of sight; neither while
 * entries are unsent or a form was begun.
 */
export function NewerVersion() {
  return useNewerVersion() ? <NewerNotice /> : null;
}

function NewerNotice() {
  const unsent = useUnsent();
  const isFormOpen = useSyncExternalStore(onUnsavedChange, hasUnsaved);
  const isClear = unsent === 0 && !isFormOpen;

  useEffect(() => {
    if (!isClear) return undefined;
    const onHide = (): void => {
      if (document.visibilityState === 'hidden' && !hasUnsaved() && navigator.onLine) loadNewerVersion();
    };
    document.addEventListener('visibilitychange', onHide);
    return () => document.removeEventListener('visibilitychange', onHide);
  }, [isClear]);

  return (
    <div className={styles.newer} role="status">
      <p>{newerWords(unsent, isFormOpen)}</p>
      {isClear && <Button onClick={loadNewerVersion}>Load it now</Button>}
    </div>
  );
}

function newerWords(unsent: number, isFormOpen: boolean): string {
  if (unsent > 0) return 'A newer version is ready. It will load after your unsent entries are sent.';
  if (isFormOpen) return 'A newer version is ready. It will load after what you have begun is finished.';
  return 'A newer version is ready.';
}
