import { describe, expect, it } from 'vitest';
import { forgetOtherUnlockChecks, keepUnlockCheck, tryUnlock, unlockKind } from './unlock-check';

const now = Date.parse('2026-03-03T22:22:41Z');

describe('unlocking without a signal', () => {
  it('opens with the secret somebody signed in with, and with no other', async () => {
    await keepUnlockCheck('p-ortiz', 'pin', '4471');
    expect(unlockKind('p-ortiz')).toBe('pin');
    expect(await tryUnlock('p-ortiz', '4472', now)).toEqual({ kind: 'wrong', triesLeft: 9 });
    expect(await tryUnlock('p-ortiz', '4471', now)).toEqual({ kind: 'open' });
    expect(await tryUnlock('p-ortiz', '4472', now)).toEqual({ kind: 'wrong', triesLeft: 9 });
  });

  it('keeps a digest and never the secret, and another one for the same secret of another person', async () => {
    await keepUnlockCheck('p-ortiz', 'password', 'five o clock to the coast');
    await keepUnlockCheck('p-osei', 'password', 'five o clock to the coast');
    const [one, other] = ['p-ortiz', 'p-osei'].map(
      (id) => localStorage.getItem(`stubpost.unlock.${id}`) ?? '',
    );
    expect(one).not.toContain('coast');
    expect(one).not.toBe(other);
  });

  it('makes a guesser wait longer and longer, and after ten wrong tries throws the digest away', async () => {
    await keepUnlockCheck('p-ortiz', 'pin', '4471');
    let clock = now;
    const waits: number[] = [];
    for (let attempt = 1; attempt < 10; attempt += 1) {
      expect(await tryUnlock('p-ortiz', '0000', clock)).toMatchObject({ kind: 'wrong' });
      const next = await tryUnlock('p-ortiz', '0000', clock);
      if (next.kind === 'wait') {
        waits.push(next.seconds);
        clock += next.seconds * 1000;
      } else attempt += 1;
    }
    expect(waits.slice(0, 4)).toEqual([5, 10, 20, 40]);
    expect(await tryUnlock('p-ortiz', '0000', clock)).toEqual({ kind: 'sign-in' });
    expect(await tryUnlock('p-ortiz', '4471', clock)).toEqual({ kind: 'sign-in' });
    expect(unlockKind('p-ortiz')).toBeNull();
  });

  it('forgets the others when somebody signs in', async () => {
    await keepUnlockCheck('p-ortiz', 'pin', '4471');
    await keepUnlockCheck('p-osei', 'pin', '9035');
    forgetOtherUnlockChecks('p-osei');
    expect([unlockKind('p-ortiz'), unlockKind('p-osei')]).toEqual([null, 'pin']);
  });
});
