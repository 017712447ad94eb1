import { readPreferences } from './preferences';
import { readDeviceClock } from './use-now';

/*
 * What the page says by itself. Two live regions stand in the page from the start (components/status-regions): a polite
 * one that speaks at most once in ten seconds, and an assertive one for "Act now" alone.
 */
type Speak = (text: string) => void;

let speakPolitely: Speak | null = null;
let speakAtOnce: Speak | null = null;
let waiting: string[] = [];
let spokenAt = Number.NEGATIVE_INFINITY;
let timer: ReturnType<typeof setTimeout> | undefined;

/** Joins the two regions of the page to the announcer; answers how to part them. */
export function joinRegions(polite: Speak, assertive: Speak): () => void {
  speakPolitely = polite;
  speakAtOnce = assertive;
  return () => {
    speakPolitely = null;
    speakAtOnce = null;
    waiting = [];
    spokenAt = Number.NEGATIVE_INFINITY;
    clearTimeout(timer);
    timer = undefined;
  };
}

function speak(): void {
  timer = undefined;
  if (waiting.length === 0) return;
  spokenAt = readDeviceClock();
  speakPolitely?.(waiting.join('; '));
  waiting = [];
}

function schedule(): void {
  if (timer !== undefined) return;
  const interval = readPreferences().announceSeconds * 1000;
  timer = setTimeout(speak, Math.max(100, spokenAt + interval - readDeviceClock()));
}

/**
 * Says something politely, together with whatever else came since the last time.
 * The same words are said once.
 */
export function announce(text: string): void {
  if (readPreferences().announce === 'act-now') return;
  waiting = [...waiting.filter((other) => other !== text), text];
  schedule();
}

/** Says an "Act now" at once. For nothing else. */
export function announceActNow(text: string): void {
  speakAtOnce?.(text);
}
