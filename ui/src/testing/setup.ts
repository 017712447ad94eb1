import '@testing-library/jest-dom/vitest';
import 'fake-indexeddb/auto';
import { cleanup, configure } from '@testing-library/react';
import { IDBFactory } from 'fake-indexeddb';
import { afterEach, beforeEach } from 'vitest';
import { forgetPreferences } from '../lib/preferences';
import { FakeEventSource } from './fake-event-source';

// What browsers have and jsdom has not.
Object.assign(globalThis, { EventSource: FakeEventSource });

/** A query that never matches: no dark preference, no wish for less motion. */
function neverMatches(media: string): MediaQueryList {
  const quiet = (): void => undefined;
  return {
    media,
    matches: false,
    onchange: null,
    addEventListener: quiet,
    removeEventListener: quiet,
    addListener: quiet,
    removeListener: quiet,
    dispatchEvent: () => false,
  };
}

/** Nothing has a size in jsdom, so nothing ever changes its size. */
class StillObserver {
  observe(): void {
    /* nothing to see */
  }
  unobserve(): void {
    /* nothing to see */
  }
  disconnect(): void {
    /* nothing to see */
  }
}

window.matchMedia ??= neverMatches;
globalThis.ResizeObserver ??= StillObserver;
Element.prototype.scrollIntoView ??= () => undefined;

// How long a page may take until a test calls it wrong; nothing waits that long when it is right.
configure({ asyncUtilTimeout: 10_000 });

beforeEach(() => {
  localStorage.clear();
  // An empty phone for each test.
  globalThis.indexedDB = new IDBFactory();
  forgetPreferences();
  FakeEventSource.all.length = 0;
});

afterEach(() => {
  cleanup();
});
