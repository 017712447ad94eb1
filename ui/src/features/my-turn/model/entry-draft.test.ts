import { recordEntrySchema } from '@stubpost/shared';
import { at, ms } from '../testing/a-wire-turn';
import { requestOf } from './entry-draft';

const id = '5f6f6a52-9f0e-4a65-9f6e-0a4d5b9f7c11';
const recording = { id, now: ms('17:22:41'), earlier: null, serverAheadMilliseconds: 2400.4 };

describe('an entry of this phone', () => {
  it('is by hand, at the moment of the touch, with the fault of the phone’s clock', () => {
    const request = requestOf({ kind: 'step-done', step: 'cab-brake-check' }, recording);
    expect(request).toEqual({
      id,
      kind: 'step-done',
      step: 'cab-brake-check',
      observedAt: at('17:22:41'),
      source: 'by-hand',
      clockOffsetMilliseconds: -2400,
    });
    expect(recordEntrySchema.parse(request)).toEqual(request);
  });

  it('is entered later when the person says that it was before', () => {
    const request = requestOf({ kind: 'departure' }, { ...recording, earlier: ms('17:20') });
    expect(request).toMatchObject({ observedAt: at('17:20'), source: 'entered-later' });
  });

  it('tells a clock without a fault as 0', () => {
    expect(
      Object.is(
        requestOf({ kind: 'briefing' }, { ...recording, serverAheadMilliseconds: 0 }).clockOffsetMilliseconds,
        0,
      ),
    ).toBe(true);
  });
});
