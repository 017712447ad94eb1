import { useEffect } from 'react';
import { startWorker } from '../lib/app-version';
import { askToPersist } from '../lib/installed';
import { useOutboxDelivery } from '../lib/outbox/use-outbox';

/** The phone's pages are fetched before they are wanted: a tunnel may come before the worker has them all. */
function fetchPhonePages(): void {
  const pages = [
    () => import('./routes/my-page'),
    () => import('./routes/my-turn-page'),
    () => import('./routes/my-outbox-page'),
    () => import('./routes/my-tie-up-page'),
  ];
  for (const page of pages) void page().catch(() => undefined);
}

/** Draws nothing. Keeps entries on their way, the app ready to open without a signal, and what is kept kept. */
export function PhoneKeeper() {
  useOutboxDelivery();
  useEffect(() => {
    void startWorker();
    askToPersist();
    fetchPhonePages();
  }, []);
  return null;
}
