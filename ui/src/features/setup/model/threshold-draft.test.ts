import { shippedThresholds, terminalThresholdsSchema } from '@stubpost/shared';
import { draftOfThresholds, readThresholds, thresholdFields } from './threshold-draft';

describe('thresholds being edited', () => {
  it('read back as they were', () => {
    expect(readThresholds(draftOfThresholds(shippedThresholds))).toEqual({
      thresholds: shippedThresholds,
      problems: [],
    });
  });

  it('have the limits of the wire', () => {
    for (const { key, lowest, highest } of thresholdFields) {
      for (const [value, isFine] of [
        [lowest, true],
        [highest, true],
        [lowest - 1, false],
        [highest + 1, false],
      ] as const) {
        expect(terminalThresholdsSchema.safeParse({ ...shippedThresholds, [key]: value }).success).toBe(
          isFine,
        );
        expect(
          readThresholds({ ...draftOfThresholds(shippedThresholds), [key]: String(value) }).problems
            .length === 0,
        ).toBe(isFine);
      }
    }
  });

  it('take whole numbers only', () => {
    expect(
      readThresholds({ ...draftOfThresholds(shippedThresholds), noWordMinutes: '3.5', onTimeSeconds: '' })
        .problems,
    ).toEqual([
      { field: 'onTimeSeconds', words: 'On time up to: a whole number from 0 to 3600.' },
      { field: 'noWordMinutes', words: 'No word after: a whole number from 1 to 120.' },
    ]);
  });
});
