import { sweepSilenceSeconds } from '@stubpost/shared';
import { FixedClock } from '../common/clock';
import { SweepHeartbeat } from './sweep-heartbeat';

describe('SweepHeartbeat', () => {
  const startedAt = Date.parse('2026-03-03T22:00:00Z');
  let clock: FixedClock;
  let heartbeat: SweepHeartbeat;
  beforeEach(() => {
    clock = new FixedClock(startedAt);
    heartbeat = new SweepHeartbeat(clock);
  });

  test('a start without a sweep yet is well for a while, and then no more', () => {
    clock.advance(sweepSilenceSeconds);
    expect([heartbeat.isWell(), heartbeat.lastSweepAt]).toEqual([true, null]);
    clock.advance(1);
    expect(heartbeat.isWell()).toBe(false);
  });

  test('silence counts from the last sweep', () => {
    clock.advance(60);
    heartbeat.beat();
    clock.advance(sweepSilenceSeconds);
    expect([heartbeat.isWell(), heartbeat.lastSweepAt]).toEqual([true, startedAt + 60_000]);
    clock.advance(1);
    expect(heartbeat.isWell()).toBe(false);
  });
});
