import { type ReadSession, SessionCache } from './session-cache';

const session = (sessionId: string, personId = 'p'): ReadSession => ({
  person: { id: personId, name: 'P', roles: [], sessionId },
  lastSeenAt: 0,
  endsAt: 1_000_000,
});

describe('SessionCache', () => {
  let cache: SessionCache;
  beforeEach(() => {
    cache = new SessionCache();
  });

  test('keeps a session for five seconds', () => {
    cache.keep(session('a'), 1000, cache.mark);
    expect(cache.find('a', 1000)).not.toBeNull();
    expect(cache.find('a', 5999)).not.toBeNull();
    expect(cache.find('a', 6000)).toBeNull();
  });

  test('trusts nothing read in the future, as after a clock was set back', () => {
    cache.keep(session('a'), 1000, cache.mark);
    expect(cache.find('a', 999)).toBeNull();
  });

  test('drops one session, or all of a person', () => {
    for (const id of ['a', 'b', 'c']) cache.keep(session(id, id === 'c' ? 'q' : 'p'), 0, cache.mark);
    cache.drop('a');
    expect([cache.find('a', 0), cache.find('b', 0)?.person.sessionId]).toEqual([null, 'b']);
    cache.dropPerson('p');
    expect([cache.find('b', 0), cache.find('c', 0)?.person.sessionId]).toEqual([null, 'c']);
  });

  test('does not keep what was read before something ended', () => {
    const mark = cache.mark;
    cache.drop('a');
    cache.keep(session('a'), 0, mark);
    expect(cache.find('a', 0)).toBeNull();
  });
});
