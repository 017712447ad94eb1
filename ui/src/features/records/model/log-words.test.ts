import type { WireLogState } from '@stubpost/shared';
import { describe, expect, it } from 'vitest';
import { chainWords, numbersOfDay, shortHash } from './log-words';

const zone = 'America/New_York';

function aState(chain: Partial<WireLogState['chain']>, entries = 48_377): WireLogState {
  return {
    chain: {
      state: 'whole',
      checkedTo: 48_377,
      checkedAt: '2026-03-03T22:20:04.000Z',
      tookMilliseconds: 1840,
      faults: [],
      faultCount: 0,
      runningTo: null,
      ...chain,
    },
    entries,
    head: null,
  };
}

describe('the words about the chain', () => {
  it('say what was checked, when and how long it took', () => {
    expect(chainWords(aState({}), zone)).toEqual({
      headline: 'Chain whole',
      lines: ['48,377 entries from no. 1, checked Tue 3 Mar 17:20:04 EST in 1.8 s.'],
    });
  });

  it('say what came in since, and how far a running check is', () => {
    expect(chainWords(aState({ runningTo: 4000 }, 48_378), zone).lines.slice(1)).toEqual([
      '1 entry came in since and will be in the next check.',
      'A check is running: no. 4,000 of 48,378.',
    ]);
  });

  it('name the number at which it breaks', () => {
    const faults = [{ sequence: 1204, words: 'No. 1,204 …' }];
    const { headline, lines } = chainWords(aState({ state: 'broken', faults, faultCount: 1 }), zone);
    expect(headline).toBe('Chain broken at no. 1,204');
    expect(lines[0]).toContain('One thing is wrong.');
    const many = aState({ state: 'broken', faults: [{ sequence: null, words: 'x' }], faultCount: 2 });
    expect(chainWords(many, zone)).toMatchObject({ headline: 'Chain broken' });
  });

  it('do not call whole what was not checked', () => {
    const waiting = { state: 'waiting', checkedAt: null, tookMilliseconds: null, checkedTo: 0 } as const;
    expect(chainWords(aState(waiting), zone).headline).toBe('Not checked yet');
    expect(chainWords(aState({ ...waiting, runningTo: 200 }), zone).lines).toEqual([
      'A check is running: no. 200 of 48,377.',
    ]);
    expect(chainWords(aState(waiting, 0), zone).headline).toBe('No entry yet');
  });

  it('shorten a hash to what is read out, and name the entries of a day', () => {
    expect(shortHash('9f3c41d2a07e5511')).toBe('9f3c 41d2 a07e');
    const head = { date: '2026-03-02', hash: 'x', publishedAt: null };
    expect(numbersOfDay({ ...head, sequence: 48_311, entries: 624 })).toBe('no. 47,688 to 48,311');
    expect(numbersOfDay({ ...head, sequence: 1, entries: 1 })).toBe('no. 1');
  });
});
