import { describe, expect, it, vi } from 'vitest';
import { buildId } from '../config/environment';
import { aPersonWith } from '../testing/render-app';
import { forgetAnswers, isUsable, keepAnswers, keptMilliseconds, restoreAnswers } from './kept-answers';
import { createQueryClient } from './query-client';
import { queryKeys } from './query-keys';

const plan = queryKeys.plans.detail('plan-1');
const conductor = aPersonWith('conductor', 'HBR');

/** A visit of somebody: what the service told them, written down when the page went out of sight. */
async function visit(person: typeof conductor): Promise<void> {
  const client = createQueryClient();
  const stop = keepAnswers(client);
  client.setQueryData(queryKeys.session.all, person);
  client.setQueryData(plan, { id: 'plan-1' });
  client.setQueryData(queryKeys.people.all, [{ id: 'p' }]);
  const seen = vi.spyOn(document, 'visibilityState', 'get').mockReturnValue('hidden');
  document.dispatchEvent(new Event('visibilitychange'));
  seen.mockRestore();
  stop();
}

async function nextVisit() {
  const client = createQueryClient();
  await restoreAnswers(client);
  return client;
}

describe('what the service told', () => {
  it('can be read by a crew at the next start, with who is signed in, and nothing of the desk’s pages', async () => {
    await visit(conductor);
    await vi.waitFor(async () => expect((await nextVisit()).getQueryData(plan)).toEqual({ id: 'plan-1' }));
    const client = await nextVisit();
    expect(client.getQueryData(queryKeys.session.all)).toEqual(conductor);
    expect(client.getQueryData(queryKeys.people.all)).toBeUndefined();
  });

  it('is not kept for people of the desk, and goes when its reader signs out', async () => {
    await visit(aPersonWith('dispatcher', 'HBR'));
    expect((await nextVisit()).getQueryData(plan)).toBeUndefined();
    await visit(conductor);
    await vi.waitFor(async () => expect((await nextVisit()).getQueryData(plan)).toBeDefined());
    await forgetAnswers();
    expect((await nextVisit()).getQueryData(plan)).toBeUndefined();
  });

  it.each([
    ['of this build, just now', { build: buildId, keptAt: 0 }, true],
    ['a day old', { build: buildId, keptAt: -keptMilliseconds }, true],
    ['older than a day', { build: buildId, keptAt: -keptMilliseconds - 1 }, false],
    ['of another build', { build: 'other', keptAt: 0 }, false],
    ['from the future by a clock set back', { build: buildId, keptAt: 3_600_001 }, false],
  ])('%s is usable: %o', (_name, { build, keptAt }, usable) => {
    const now = Date.parse('2026-03-03T22:22:41Z');
    expect(isUsable({ build, keptAt: now + keptAt }, now)).toBe(usable);
  });

  it('that never was is not usable', () => {
    expect(isUsable(undefined, 0)).toBe(false);
  });
});
