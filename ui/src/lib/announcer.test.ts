import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { announce, announceActNow, joinRegions } from './announcer';
import { setPreferences } from './preferences';
import { replaceDeviceClock } from './use-now';

let polite: string[];
let assertive: string[];
let part: () => void;
let putBack: () => void;

beforeEach(() => {
  vi.useFakeTimers();
  polite = [];
  assertive = [];
  putBack = replaceDeviceClock(() => vi.getMockedSystemTime()?.valueOf() ?? 0);
  part = joinRegions(
    (text) => polite.push(text),
    (text) => assertive.push(text),
  );
});

afterEach(() => {
  part();
  putBack();
  vi.useRealTimers();
});

describe('the polite region', () => {
  test('collects what changes and speaks at most once in ten seconds', () => {
    announce('Turn 1 changed');
    vi.advanceTimersByTime(200);
    announce('Turn 2 changed');
    announce('Turn 3 changed');
    vi.advanceTimersByTime(9000);
    expect(polite).toEqual(['Turn 1 changed']);
    vi.advanceTimersByTime(1000);
    expect(polite).toEqual(['Turn 1 changed', 'Turn 2 changed; Turn 3 changed']);
  });

  test('speaks as seldom as the person wants', () => {
    setPreferences({ announceSeconds: 60 });
    announce('One');
    vi.advanceTimersByTime(200);
    announce('Two');
    vi.advanceTimersByTime(59_000);
    expect(polite).toEqual(['One']);
    vi.advanceTimersByTime(1000);
    expect(polite).toEqual(['One', 'Two']);
  });

  test('makes words under one key at the moment of speaking, once', () => {
    let count = 0;
    const words = (): string => `${count} turns changed`;
    count = 1;
    announce(words, 'turns');
    count = 2;
    announce(words, 'turns');
    vi.advanceTimersByTime(200);
    expect(polite).toEqual(['2 turns changed']);
  });

  test('is silent for somebody who wants only "Act now"', () => {
    setPreferences({ announce: 'act-now' });
    announce('Turn 1 changed');
    vi.advanceTimersByTime(20_000);
    expect(polite).toEqual([]);
  });
});

test('"Act now" is said at once, also to somebody who wants nothing else', () => {
  setPreferences({ announce: 'act-now' });
  announceActNow('Act now. Track 3');
  expect(assertive).toEqual(['Act now. Track 3']);
});
