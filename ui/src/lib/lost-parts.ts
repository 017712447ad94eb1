import { buildId } from '../config/environment';
import { hasUnsaved } from './unsaved';

/** Where it is noted that this build was already loaded anew once; kept for the life of the tab. */
const place = 'stubpost.loaded-anew';
/** Longest wait for the question whether the server is there. Our choice. */
const patienceMilliseconds = 4000;

/** Whether the server answers: without it a new load would end on an empty page. */
async function isServerThere(): Promise<boolean> {
  try {
    const answer = await fetch('/api/health', {
      cache: 'no-store',
      signal: AbortSignal.timeout(patienceMilliseconds),
    });
    return answer.status > 0;
  } catch {
    return false;
  }
}

/**
 * Loads the page anew after a part of it could not be loaded: once per build and tab, never without a signal, never over
 * a form that was begun. The usual cause is a newer version that was put in the place of this one.
 */
export async function reloadForLostPart(): Promise<void> {
  if (hasUnsaved() || sessionStorage.getItem(place) === buildId) return;
  if (!navigator.onLine || !(await isServerThere()) || hasUnsaved()) return;
  sessionStorage.setItem(place, buildId);
  location.reload();
}

/** Listens for parts that did not load. Called once, before the first page is drawn. */
export function watchLostParts(): void {
  window.addEventListener('vite:preloadError', () => void reloadForLostPart());
}
