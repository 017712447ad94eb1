import { Refusal } from '../common/refusal';
import { Passwords } from './passwords';

describe('Passwords', () => {
  test('hashes differ each time and check only against their own password', async () => {
    const passwords = new Passwords();
    const [first, second] = await Promise.all([1, 2].map(() => passwords.hash('seven tall lanterns')));
    expect(first).not.toBe(second);
    expect(await passwords.verify(first ?? null, 'seven tall lanterns')).toBe(true);
    expect(await passwords.verify(first ?? null, 'Seven tall lanterns')).toBe(false);
  });

  test('nobody’s password is never right, not even the one the decoy is made of', async () => {
    const passwords = new Passwords();
    expect(await passwords.verify(null, 'nobody has this password')).toBe(false);
  });

  test('two are worked on, sixty wait, the rest are told to come again; nobody is forgotten', async () => {
    const passwords = new Passwords();
    const outcomes = await Promise.allSettled(
      [...Array(70).keys()].map(() => passwords.hash('seven tall lanterns')),
    );
    const turnedAway = outcomes.flatMap((outcome) =>
      outcome.status === 'rejected' ? [outcome.reason as unknown] : [],
    );
    expect(turnedAway).toHaveLength(8);
    for (const reason of turnedAway) expect(reason).toMatchObject({ code: 'server.busy', status: 503 });
    expect(turnedAway[0]).toBeInstanceOf(Refusal);
    expect(await passwords.hash('works again afterwards')).toContain('argon2id');
  });
});
