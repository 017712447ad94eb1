import { temporaryFolder } from '../support/temporary-folder';
import { buildPowerCutLibrary, crashOnce } from './crash-rounds';

/** Rounds of each kind; a nightly run asks for more. Each round kills after another number of acknowledgements. */
const rounds = Number(process.env.CRASH_ROUNDS ?? 5);
const acknowledgementsOf = (round: number) => 60 + ((round * 7919) % 240);

jest.setTimeout(30_000 + rounds * 20_000);

let temporary: ReturnType<typeof temporaryFolder>;
beforeEach(() => {
  temporary = temporaryFolder();
});
afterEach(() => temporary.remove());

describe('what was acknowledged', () => {
  test('outlives kill -9 at any moment, whole and in a sound database', async () => {
    for (let round = 0; round < rounds; round += 1) {
      const after = await crashOnce({
        folder: temporary.folder,
        synchronous: 'FULL',
        acknowledgements: acknowledgementsOf(round),
      });
      expect(after).toMatchObject({ lost: [], integrity: 'ok', isHalfApplied: false });
      expect(after.acknowledged).toBeGreaterThanOrEqual(acknowledgementsOf(round));
    }
  });

  test('outlives a power cut in which everything not synced is lost', async () => {
    const powerCutLibrary = buildPowerCutLibrary(temporary.folder);
    for (let round = 0; round < rounds; round += 1) {
      const after = await crashOnce({
        folder: temporary.folder,
        synchronous: 'FULL',
        acknowledgements: acknowledgementsOf(round),
        powerCutLibrary,
      });
      expect(after).toMatchObject({ lost: [], integrity: 'ok', isHalfApplied: false });
    }
  });

  test('is lost in the same power cut without synchronous=FULL: the trial bites', async () => {
    const powerCutLibrary = buildPowerCutLibrary(temporary.folder);
    const after = await crashOnce({
      folder: temporary.folder,
      synchronous: 'NORMAL',
      acknowledgements: acknowledgementsOf(0),
      powerCutLibrary,
    });
    expect(after.lost.length).toBeGreaterThan(0);
    expect(after).toMatchObject({ integrity: 'ok', isHalfApplied: false });
  });
});
