import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { splitDelay } from './delay-split';

const at = (clock: string): number => Date.parse(`2026-03-03T${clock}:00Z`);
const minimumTurnSeconds = 12 * 60;

// Worked by hand from the definition.
const worked: ReadonlyArray<[string, string, number, number, number, number]> = [
  ['08:14', '08:29', 6, 3, 0, 0],
  ['08:05', '08:24', 0, 4, 0, 0],
  ['08:20', '08:30', 10, 0, 2, 0],
  ['08:00', '08:19', 0, 0, 0, 1],
];

describe('splitDelay', () => {
  it.each(worked)(
    'arrived %s, due out 08:20, left %s',
    (arrived, departed, inherited, here, recovered, early) => {
      const split = splitDelay({
        scheduledDepartureAt: at('08:20'),
        actualDepartureAt: at(departed),
        actualArrivalAt: at(arrived),
        minimumTurnSeconds,
      });
      expect(split).toMatchObject({
        inheritedSeconds: inherited * 60,
        causedHereSeconds: here * 60,
        recoveredSeconds: recovered * 60,
        earlySeconds: early * 60,
      });
    },
  );

  it('always adds up to the delay, with no part below nothing', () => {
    const seconds = fc.integer({ min: -3600, max: 7200 });
    fc.assert(
      fc.property(seconds, seconds, fc.integer({ min: 0, max: 1800 }), (departed, arrived, minimum) => {
        const split = splitDelay({
          scheduledDepartureAt: at('08:20'),
          actualDepartureAt: at('08:20') + departed * 1000,
          actualArrivalAt: at('08:20') + arrived * 1000,
          minimumTurnSeconds: minimum,
        });
        expect(split.inheritedSeconds + split.causedHereSeconds).toBe(split.delaySeconds);
        expect(Math.min(...Object.values(split))).toBeGreaterThanOrEqual(0);
      }),
      { seed: 20260305, numRuns: 300 },
    );
  });

  it('inherits nothing on a first train out', () => {
    const split = splitDelay({
      scheduledDepartureAt: at('05:00'),
      actualDepartureAt: at('05:07'),
      actualArrivalAt: null,
      minimumTurnSeconds,
    });
    expect(split).toMatchObject({ inheritedSeconds: 0, causedHereSeconds: 420 });
  });
});
