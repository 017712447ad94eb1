import { useSyncExternalStore } from 'react';
import type { Instant } from '@stubpost/shared';

/*
 * The one reader of the clock in the browser. The device's clock is corrected by what answers of the server tell about
 * theirs, because lateness is counted in seconds and phones are often wrong by more.
 */
let deviceClock = (): Instant => Date.now();

/** What may be added to the device's clock: somewhere between these two. Unknown at first. */
const UNKNOWN = { low: Number.NEGATIVE_INFINITY, high: Number.POSITIVE_INFINITY };
let bounds = UNKNOWN;

/** Where the correction found last is kept, so that a phone started without a signal does not fall back to its wrong clock. */
const place = 'stubpost.clock';
/** Corrections nearer together than this are not written anew. */
const worthKeepingMilliseconds = 250;
let remembered = readKept();

function readKept(): number | null {
  try {
    const kept = Number(localStorage.getItem(place) ?? Number.NaN);
    return Number.isFinite(kept) ? kept : null;
  } catch {
    return null;
  }
}

function keep(offset: number): void {
  if (remembered !== null && Math.abs(remembered - offset) < worthKeepingMilliseconds) return;
  remembered = offset;
  try {
    localStorage.setItem(place, String(Math.round(offset)));
  } catch {
    // Nothing is kept; the next start begins with the device's own clock.
  }
}

/** The device's own clock, uncorrected: for measuring how long something took. */
export function readDeviceClock(): Instant {
  return deviceClock();
}

/** Puts another clock in the place of the device's; answers how to put the old one back. For tests and replays. */
export function replaceDeviceClock(read: () => Instant): () => void {
  const before = deviceClock;
  deviceClock = read;
  forgetClock();
  return () => {
    deviceClock = before;
    forgetClock();
  };
}

function forgetClock(): void {
  bounds = UNKNOWN;
  remembered = null;
}

/**
 * Takes one hint about the server's clock: server time minus device time lies between `earliest` and `latest`
 * milliseconds. Hints narrow one another; one that contradicts the others (the device's clock was set) starts anew.
 */
export function noteServerTime(hint: { earliest: number; latest: number }): void {
  const low = Math.max(bounds.low, hint.earliest);
  const high = Math.min(bounds.high, hint.latest);
  bounds = low <= high ? { low, high } : { low: hint.earliest, high: hint.latest };
  keep(clockOffsetMilliseconds());
}

/** Whether the device's clock was compared with the server's since the page was opened. */
export function isClockCompared(): boolean {
  return bounds !== UNKNOWN;
}

/**
 * Milliseconds by which the server's clock is ahead of the device's: the smallest correction the hints allow; before the
 * first hint, the correction of the last visit.
 */
export function clockOffsetMilliseconds(): number {
  if (!isClockCompared()) return remembered ?? 0;
  return Math.min(Math.max(0, bounds.low), bounds.high);
}

/** Now by the server's clock, as well as we know it. */
export function readNow(): Instant {
  return deviceClock() + clockOffsetMilliseconds();
}

/** A moment of the device's clock, by the server's clock as well as we know it. */
export function toServerTime(deviceTime: Instant): Instant {
  return deviceTime + clockOffsetMilliseconds();
}

const millisecondsInTick = 1000;
const listeners = new Set<() => void>();
let timer: ReturnType<typeof setTimeout> | undefined;
let tick: Instant | null = null;

const currentSecond = (): Instant => Math.floor(readNow() / millisecondsInTick) * millisecondsInTick;

function beat(): void {
  const second = currentSecond();
  if (second !== tick) {
    tick = second;
    for (const listener of listeners) listener();
  }
  timer = setTimeout(beat, millisecondsInTick - (readNow() % millisecondsInTick) + 5);
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  if (timer === undefined) {
    tick = currentSecond();
    timer = setTimeout(beat, millisecondsInTick - (readNow() % millisecondsInTick) + 5);
  }
  return () => {
    listeners.delete(listener);
    if (listeners.size === 0) {
      clearTimeout(timer);
      timer = undefined;
      tick = null;
    }
  };
}

/**
 * Now, in whole seconds, redrawn once a second. With `everySeconds` it stands still in between: 15 for people who
 * asked for less motion, 60 for words such as "12 min ago".
 */
export function useNow(everySeconds = 1): Instant {
  const step = everySeconds * millisecondsInTick;
  return useSyncExternalStore(subscribe, () => Math.floor((tick ?? currentSecond()) / step) * step);
}
