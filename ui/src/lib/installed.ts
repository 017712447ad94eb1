import { useEffect, useState, useSyncExternalStore } from 'react';
import { useMedia } from './use-media';

/** What Chromium hands out when it would offer to install; other browsers never do. */
interface InstallOffer extends Event {
  prompt: () => Promise<unknown>;
}

let offer: InstallOffer | null = null;
const listeners = new Set<() => void>();

function setOffer(next: InstallOffer | null): void {
  offer = next;
  for (const listener of listeners) listener();
}

/** Keeps the browser's offer to install for our own button. Called once, before the first page is drawn. */
export function awaitInstallOffer(): void {
  window.addEventListener('beforeinstallprompt', (event) => {
    event.preventDefault();
    setOffer(event as InstallOffer);
  });
  window.addEventListener('appinstalled', () => setOffer(null));
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

/** How the app stands on this phone. */
export interface Installed {
  /** Opened from the home screen. */
  isInstalled: boolean;
  /** Asks the browser to install; null where only the person can do it. */
  install: (() => void) | null;
}

/** Whether the app was opened from the home screen, and how to put it there. */
export function useInstalled(): Installed {
  const isStandalone = useMedia('(display-mode: standalone)');
  const held = useSyncExternalStore(subscribe, () => offer);
  // Safari on iPhone says it in its own way.
  const isOnIphone = (navigator as Navigator & { standalone?: boolean }).standalone === true;
  return {
    isInstalled: isStandalone || isOnIphone,
    install: held === null ? null : () => void held.prompt().finally(() => setOffer(null)),
  };
}

/** Whether the browser has promised not to clear what is kept: null while it is asked or where it does not say. */
export function usePersisted(): { isPersisted: boolean | null; ask: () => void } {
  const [isPersisted, setPersisted] = useState<boolean | null>(null);
  useEffect(() => {
    let isGone = false;
    void storageManager()
      ?.persisted()
      .then((persisted) => {
        if (!isGone) setPersisted(persisted);
      });
    return () => {
      isGone = true;
    };
  }, []);
  return { isPersisted, ask: () => void storageManager()?.persist().then(setPersisted) };
}

/** Asks once, without a question to the person where the browser decides by itself. */
export function askToPersist(): void {
  void storageManager()
    ?.persist()
    .catch(() => undefined);
}

/** Absent on plain http and in old browsers, whatever the types say. */
function storageManager(): StorageManager | undefined {
  const manager = navigator.storage as StorageManager | undefined;
  return typeof manager?.persist === 'function' ? manager : undefined;
}
