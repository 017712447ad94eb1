import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { FakeServer } from '../testing/fake-server';
import { reloadForLostPart } from './lost-parts';

const health = { status: 'ok', version: '0', schema: 's', lastSweepAt: null };

describe('a part that did not load', () => {
  let server: FakeServer;
  const reload = vi.fn();
  const realLocation = window.location;
  beforeEach(() => {
    sessionStorage.clear();
    reload.mockClear();
    server = new FakeServer().on('GET', '/api/health', health);
    vi.stubGlobal('location', { ...realLocation, pathname: '/my', reload });
  });
  afterEach(() => {
    server.stop();
    vi.unstubAllGlobals();
    vi.restoreAllMocks();
  });

  it('loads the page anew once, and never twice for one build', async () => {
    await reloadForLostPart();
    await reloadForLostPart();
    expect(reload).toHaveBeenCalledTimes(1);
  });

  it('does not load anew without a signal', async () => {
    vi.spyOn(navigator, 'onLine', 'get').mockReturnValue(false);
    await reloadForLostPart();
    expect(reload).not.toHaveBeenCalled();
  });

  it('does not load anew while the server is not there', async () => {
    server.on('GET', '/api/health', () => {
      throw new TypeError('no network');
    });
    await reloadForLostPart();
    expect(reload).not.toHaveBeenCalled();
    expect(sessionStorage).toHaveLength(0);
  });
});
