import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { FakeEventSource } from '../testing/fake-event-source';
import { aWireTurn, clockAt } from '../testing/wire-turn';
import { LiveStream, type LiveMessage } from './live-stream';
import { clockOffsetMilliseconds, replaceDeviceClock } from './use-now';

let messages: LiveMessage[];
let stream: LiveStream;
let putBack: () => void;

const pass = (seconds: number): void => {
  vi.advanceTimersByTime(seconds * 1000);
};
const kinds = (): string[] => messages.map(({ kind }) => kind);

beforeEach(() => {
  vi.useFakeTimers({ now: clockAt('16:55') });
  putBack = replaceDeviceClock(() => Date.now());
  messages = [];
  stream = new LiveStream(
    'HBR',
    (message) => messages.push(message),
    (url) => new FakeEventSource(url) as unknown as EventSource,
  );
  stream.start();
});

afterEach(() => {
  stream.stop();
  putBack();
  vi.useRealTimers();
});

describe('a live stream', () => {
  test('is live from the first word on', () => {
    expect(stream.snapshot()).toEqual({ live: false, lastWordAt: null, retryInSeconds: 0 });
    FakeEventSource.last().emit('beat');
    expect(stream.snapshot()).toMatchObject({ live: true, lastWordAt: clockAt('16:55') });
    expect(FakeEventSource.last().url).toBe('/api/live?terminal=HBR');
  });

  test('hands on turns and alerts, whether they stand beside id and version or under their name', () => {
    const turn = aWireTurn({}, clockAt('16:55'));
    FakeEventSource.last().emit('turn', turn);
    FakeEventSource.last().emit('turn', { id: turn.id, version: turn.version, turn });
    FakeEventSource.last().emit('turn', { id: 'no turn' });
    expect(messages).toEqual([
      { kind: 'turn', turn },
      { kind: 'turn', turn },
    ]);
  });

  test('takes the server’s clock from a beat', () => {
    FakeEventSource.last().emit('beat', { now: new Date(clockAt('16:55:03')).toISOString() });
    expect(clockOffsetMilliseconds()).toBe(3000);
  });

  test('stays live over a quiet while as long as it beats', () => {
    for (let beat = 0; beat < 6; beat += 1) {
      FakeEventSource.last().emit('beat');
      pass(5);
    }
    expect(stream.snapshot().live).toBe(true);
    expect(FakeEventSource.all).toHaveLength(1);
  });

  test('is lost after ten seconds without a word, and says when it is tried again', () => {
    FakeEventSource.last().emit('beat');
    pass(9);
    expect(stream.snapshot().live).toBe(true);
    pass(1);
    expect(stream.snapshot()).toEqual({ live: false, lastWordAt: clockAt('16:55'), retryInSeconds: 5 });
    pass(3);
    expect(stream.snapshot().retryInSeconds).toBe(2);
    pass(2);
    expect(FakeEventSource.all).toHaveLength(2);
  });

  test('asks for what is on screen every fifteen seconds while lost', () => {
    FakeEventSource.last().emit('beat');
    pass(10);
    expect(kinds()).toEqual(['poll']);
    pass(14);
    expect(kinds()).toEqual(['poll']);
    pass(1);
    expect(kinds()).toEqual(['poll', 'poll']);
  });

  test('goes on from the last change that was seen, and asks for nothing more then', () => {
    FakeEventSource.last().emit('beat', {}, '41');
    pass(15);
    expect(FakeEventSource.last().url).toBe('/api/live?terminal=HBR&lastEventId=41');
    FakeEventSource.last().emit('beat', {}, '43');
    expect(stream.snapshot().live).toBe(true);
    expect(kinds()).not.toContain('reload');
  });

  test('asks for everything when it cannot tell where it stopped', () => {
    FakeEventSource.last().emit('beat');
    pass(15);
    FakeEventSource.last().emit('beat');
    expect(kinds()).toContain('reload');
  });

  test('closes its source and its timer', () => {
    const source = FakeEventSource.last();
    stream.stop();
    pass(60);
    expect(source.isClosed).toBe(true);
    expect(FakeEventSource.all).toHaveLength(1);
  });
});
