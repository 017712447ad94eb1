import { useSyncExternalStore } from 'react';

export const THEMES = ['system', 'light', 'dark', 'daylight'] as const;
export type Theme = (typeof THEMES)[number];

/** What the page says by itself to people who listen to it. */
export const ANNOUNCEMENTS = ['all', 'act-now'] as const;
export type Announcements = (typeof ANNOUNCEMENTS)[number];

/** Seconds between two announcements at the desk; the first is the default. */
export const ANNOUNCE_SECONDS = [10, 30, 60] as const;

/** What a person set for this browser. Kept on the device: a shared phone and a desk want different things. */
export interface Preferences {
  theme: Theme;
  /** States told by shape and word only. */
  noColour: boolean;
  announce: Announcements;
  announceSeconds: number;
  /** Single-letter keys of the lists and panels. Ctrl-K, arrows, Enter and Esc always work. */
  letterKeys: boolean;
}

const SHIPPED: Preferences = {
  theme: 'system',
  noColour: false,
  announce: 'all',
  announceSeconds: ANNOUNCE_SECONDS[0],
  letterKeys: true,
};

const place = 'stubpost.preferences';
const listeners = new Set<() => void>();
let kept: Preferences | null = null;

function oneOf<T>(known: readonly T[], value: unknown, otherwise: T): T {
  return known.includes(value as T) ? (value as T) : otherwise;
}

/** Reads what is kept; anything strange in it falls back to the shipped value. */
function parsePreferences(text: string | null): Preferences {
  let raw: Partial<Record<keyof Preferences, unknown>> = {};
  try {
    const parsed: unknown = JSON.parse(text ?? '{}');
    if (typeof parsed === 'object' && parsed !== null) raw = parsed;
  } catch {
    return SHIPPED;
  }
  return {
    theme: oneOf(THEMES, raw.theme, SHIPPED.theme),
    noColour: raw.noColour === true,
    announce: oneOf(ANNOUNCEMENTS, raw.announce, SHIPPED.announce),
    announceSeconds: oneOf<number>(ANNOUNCE_SECONDS, raw.announceSeconds, SHIPPED.announceSeconds),
    letterKeys: raw.letterKeys !== false,
  };
}

/** The preferences now, outside of drawing. */
export function readPreferences(): Preferences {
  kept ??= parsePreferences(localStorage.getItem(place));
  return kept;
}

/** Changes some of the preferences, for this browser, at once and for the next visit. */
export function setPreferences(change: Partial<Preferences>): void {
  kept = { ...readPreferences(), ...change };
  localStorage.setItem(place, JSON.stringify(kept));
  for (const listener of listeners) listener();
}

/** Forgets what was read, so that the next reader looks into the store again. */
export function forgetPreferences(): void {
  kept = null;
  for (const listener of listeners) listener();
}

function subscribe(listener: () => void): () => void {
  const onStorage = (event: StorageEvent): void => {
    if (event.key === place) forgetPreferences();
  };
  listeners.add(listener);
  window.addEventListener('storage', onStorage);
  return () => {
    listeners.delete(listener);
    window.removeEventListener('storage', onStorage);
  };
}

/** The preferences of this browser. */
export function usePreferences(): Preferences {
  return useSyncExternalStore(subscribe, readPreferences);
}
