import { act, renderHook } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { clockOffsetMilliseconds, noteServerTime, readNow, replaceDeviceClock, useNow } from './use-now';

let device = 0;
let putBack: () => void;

beforeEach(() => {
  device = Date.parse('2026-03-03T22:22:41.400Z');
  putBack = replaceDeviceClock(() => device);
});

afterEach(() => {
  putBack();
  vi.useRealTimers();
});

describe('the corrected clock', () => {
  test('is the device’s until the server has told its own', () => {
    expect(clockOffsetMilliseconds()).toBe(0);
    expect(readNow()).toBe(device);
  });

  test('is not moved by a hint that the device’s clock already fits', () => {
    noteServerTime({ earliest: -300, latest: 600 });
    expect(clockOffsetMilliseconds()).toBe(0);
  });

  test('takes the smallest correction that fits all hints', () => {
    noteServerTime({ earliest: 2000, latest: 2999 });
    noteServerTime({ earliest: 2400, latest: 3399 });
    expect(clockOffsetMilliseconds()).toBe(2400);
    noteServerTime({ earliest: 1500, latest: 2450 });
    expect(clockOffsetMilliseconds()).toBe(2400);
  });

  test('starts anew when a hint contradicts the earlier ones', () => {
    noteServerTime({ earliest: 2000, latest: 2999 });
    noteServerTime({ earliest: -5000, latest: -4001 });
    expect(clockOffsetMilliseconds()).toBe(-4001);
  });
});

describe('useNow', () => {
  test('goes on by whole seconds', () => {
    vi.useFakeTimers();
    const { result } = renderHook(() => useNow());
    expect(new Date(result.current).toISOString()).toBe('2026-03-03T22:22:41.000Z');
    act(() => {
      device += 700;
      vi.advanceTimersByTime(700);
    });
    expect(new Date(result.current).toISOString()).toBe('2026-03-03T22:22:42.000Z');
  });

  test('stands still in between when asked seldom', () => {
    vi.useFakeTimers();
    const { result } = renderHook(() => useNow(15));
    const before = result.current;
    act(() => {
      device += 2000;
      vi.advanceTimersByTime(2000);
    });
    expect(result.current).toBe(before);
  });
});
