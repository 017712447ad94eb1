import { useSyncExternalStore } from 'react';

/*
 * The worker that opens the app without a signal, and how a newer version comes in: it is fetched in the background and
 * waits until a page says that it may take over. No page is ever loaded anew by itself while something could be lost.
 */
const workerFile = '/worker.js';
/** How often a page that stays open looks for a newer version. Our choice. */
const lookMilliseconds = 30 * 60_000;

let waiting: ServiceWorker | null = null;
const listeners = new Set<() => void>();

function setWaiting(worker: ServiceWorker | null): void {
  waiting = worker;
  for (const listener of listeners) listener();
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

/** A worker that is installed beside one in charge is a newer version; the very first one is not. */
function note(registration: ServiceWorkerRegistration): void {
  if (registration.waiting !== null && navigator.serviceWorker.controller !== null)
    setWaiting(registration.waiting);
}

function watch(registration: ServiceWorkerRegistration): void {
  note(registration);
  registration.addEventListener('updatefound', () => {
    registration.installing?.addEventListener('statechange', () => note(registration));
  });
  const look = (): void => {
    if (document.visibilityState === 'visible' && navigator.onLine)
      void registration.update().catch(() => undefined);
  };
  document.addEventListener('visibilitychange', look);
  setInterval(look, lookMilliseconds);
}

/** Absent on plain http away from this machine, whatever the types say. */
const container = (): ServiceWorkerContainer | undefined =>
  (navigator as Partial<Pick<Navigator, 'serviceWorker'>>).serviceWorker;

let isStarted = false;

/** Installs the worker, for people who work on the phone. */
export async function startWorker(): Promise<void> {
  if (isStarted || container() === undefined || import.meta.env.DEV) return;
  isStarted = true;
  try {
    watch(await navigator.serviceWorker.register(workerFile, { type: 'classic', updateViaCache: 'none' }));
  } catch {
    // Without a worker the app works as long as there is a signal.
    isStarted = false;
  }
}

/** Watches for newer versions where a worker is there from before; installs none. */
export async function watchWorker(): Promise<void> {
  if (isStarted || container() === undefined || import.meta.env.DEV) return;
  const registration = await navigator.serviceWorker.getRegistration();
  if (registration === undefined || isStarted) return;
  isStarted = true;
  watch(registration);
}

/** Whether a newer version waits. */
export function useNewerVersion(): boolean {
  return useSyncExternalStore(subscribe, () => waiting !== null);
}

/** Lets the newer version take over and loads this page anew with it. Other pages go on with what they have. */
export function loadNewerVersion(): void {
  const worker = waiting;
  if (worker === null) return;
  navigator.serviceWorker.addEventListener('controllerchange', () => location.reload(), { once: true });
  worker.postMessage({ type: 'SKIP_WAITING' });
}
