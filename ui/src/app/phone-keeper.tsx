import { useEffect } from 'react';
import { startWorker } from '../lib/app-version';
import { askToPersist } from '../lib/installed';
import { useOutboxDelivery } from '../lib/outbox/use-outbox';

/** Draws nothing. Keeps entries on their way, the app ready to open without a signal, and what is kept kept. */
export function PhoneKeeper() {
  useOutboxDelivery();
  useEffect(() => {
    void startWorker();
    askToPersist();
  }, []);
  return null;
}
