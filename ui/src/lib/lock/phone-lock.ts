import { useEffect, useSyncExternalStore } from 'react';
import { readDeviceClock } from '../use-now';

/** A phone that nobody touched for this long is locked. Our choice, as on the sign-in page. */
export const lockAfterMinutes = 10;
const lockAfterMilliseconds = lockAfterMinutes * 60_000;
/** Touches are written down no more often than this. */
const touchMilliseconds = 15_000;
/** How often the time since the last touch is looked at. */
const lookMilliseconds = 5000;

const lockPlace = 'stubpost.lock';
const touchPlace = 'stubpost.touched';
const listeners = new Set<() => void>();

function tell(): void {
  for (const listener of listeners) listener();
}

function subscribe(listener: () => void): () => void {
  const onStorage = ({ key }: StorageEvent): void => {
    if (key === lockPlace || key === touchPlace) listener();
  };
  listeners.add(listener);
  window.addEventListener('storage', onStorage);
  return () => {
    listeners.delete(listener);
    window.removeEventListener('storage', onStorage);
  };
}

function kept(place: string): string | null {
  try {
    return localStorage.getItem(place);
  } catch {
    return null;
  }
}

function keep(place: string, text: string): void {
  try {
    localStorage.setItem(place, text);
  } catch {
    // Nothing can be kept: the lock then lasts as long as the page.
  }
}

/** Locks the phone for a person; a page opened later is locked, too. */
export function lockPhone(personId: string): void {
  keep(lockPlace, personId);
  tell();
}

/** Opens the phone, and counts it as touched. */
export function unlockPhone(): void {
  keep(lockPlace, '');
  keep(touchPlace, String(readDeviceClock()));
  tell();
}

/** Whether so much time has passed since the last touch that the phone locks. A clock set back counts as a touch long ago. */
export function isLeftAlone(touchedAt: number, now: number): boolean {
  return Math.abs(now - touchedAt) >= lockAfterMilliseconds;
}

const isLockedFor = (personId: string): boolean => kept(lockPlace) === personId;

/** Whether the phone is locked for this person. Watches for touches, and locks after ten minutes without one. */
export function usePhoneLock(personId: string, isOn: boolean): boolean {
  const isLocked = useSyncExternalStore(subscribe, () => isOn && isLockedFor(personId));

  useEffect(() => {
    if (!isOn || isLocked) return undefined;
    const touched = (): number => Number(kept(touchPlace) ?? Number.NaN);
    const look = (): void => {
      const at = touched();
      if (!Number.isNaN(at) && isLeftAlone(at, readDeviceClock())) lockPhone(personId);
    };
    const touch = (): void => {
      const [now, at] = [readDeviceClock(), touched()];
      // The touch that wakes a phone left alone does not keep it open.
      if (!Number.isNaN(at) && isLeftAlone(at, now)) lockPhone(personId);
      else if (Number.isNaN(at) || now - at >= touchMilliseconds) keep(touchPlace, String(now));
    };
    if (Number.isNaN(touched())) keep(touchPlace, String(readDeviceClock()));
    look();
    const timer = setInterval(look, lookMilliseconds);
    const whats = ['pointerdown', 'keydown'] as const;
    for (const what of whats) document.addEventListener(what, touch, true);
    document.addEventListener('visibilitychange', look);
    return () => {
      clearInterval(timer);
      for (const what of whats) document.removeEventListener(what, touch, true);
      document.removeEventListener('visibilitychange', look);
    };
  }, [isLocked, isOn, personId]);

  return isLocked;
}
