import { readPreferences } from './preferences';
import { readDeviceClock } from './use-now';

/*
 * What the page says by itself. Two live regions stand in the page from the start (components/status-regions): a polite
 * one that speaks at most once in ten seconds, and an assertive one for "Act now" alone.
 */
type Speak = (text: string) => void;

let speakPolitely: Speak | null = null;
let speakAtOnce: Speak | null = null;
const waiting = new Map<string, () => string>();
let spokenAt = Number.NEGATIVE_INFINITY;
let timer: ReturnType<typeof setTimeout> | undefined;

function reset(): void {
  speakPolitely = null;
  speakAtOnce = null;
  waiting.clear();
  spokenAt = Number.NEGATIVE_INFINITY;
  clearTimeout(timer);
  timer = undefined;
}

/** Joins the two regions of the page to the announcer; answers how to part them. */
export function joinRegions(polite: Speak, assertive: Speak): () => void {
  speakPolitely = polite;
  speakAtOnce = assertive;
  return reset;
}

function speak(): void {
  timer = undefined;
  const texts = [...waiting.values()].map((words) => words()).filter((text) => text !== '');
  waiting.clear();
  if (texts.length === 0) return;
  spokenAt = readDeviceClock();
  speakPolitely?.(texts.join('; '));
}

/**
 * Says something politely, together with whatever else came since the last time. Words under the same `key` (the text
 * itself when absent) replace one another; given as a function they are made at the moment of speaking.
 */
export function announce(words: string | (() => string), key?: string): void {
  if (speakPolitely === null || readPreferences().announce === 'act-now') return;
  const make = typeof words === 'string' ? () => words : words;
  waiting.set(key ?? make(), make);
  if (timer !== undefined) return;
  const interval = readPreferences().announceSeconds * 1000;
  timer = setTimeout(speak, Math.max(100, spokenAt + interval - readDeviceClock()));
}

/** Answers the person's own act in the polite region at once: it is what they wait for, whatever else they want to hear. */
export function announceOwnAct(text: string): void {
  speakPolitely?.(text);
}

/** Says an "Act now" at once. For nothing else. */
export function announceActNow(text: string): void {
  speakAtOnce?.(text);
}
