import { noteSoak } from '../support/soak-report';
import { temporaryFolder } from '../support/temporary-folder';
import { type AfterCrash, buildPowerCutLibrary, crashOnce } from './crash-rounds';

/** Rounds of each kind; a nightly run asks for more. Each round kills after another number of acknowledgements. */
const rounds = Number(process.env.CRASH_ROUNDS ?? 5);
const acknowledgementsOf = (round: number) => 60 + ((round * 7919) % 240);

jest.setTimeout(30_000 + rounds * 20_000);

let temporary: ReturnType<typeof temporaryFolder>;
beforeEach(() => {
  temporary = temporaryFolder();
});
afterEach(() => temporary.remove());

function noteRounds(part: string, found: readonly AfterCrash[]): void {
  const sum = (of: (each: AfterCrash) => number) => found.reduce((total, each) => total + of(each), 0);
  noteSoak({
    part,
    rounds: found.length,
    acknowledged: sum(({ acknowledged }) => acknowledged),
    lost: sum(({ lost }) => lost.length),
    doubled: 0,
    chain: 'not kept here',
  });
}

describe('what was acknowledged', () => {
  test('outlives kill -9 at any moment, whole and in a sound database', async () => {
    const found: AfterCrash[] = [];
    for (let round = 0; round < rounds; round += 1) {
      const after = await crashOnce({
        folder: temporary.folder,
        synchronous: 'FULL',
        acknowledgements: acknowledgementsOf(round),
      });
      expect(after).toMatchObject({ lost: [], integrity: 'ok', isHalfApplied: false });
      expect(after.acknowledged).toBeGreaterThanOrEqual(acknowledgementsOf(round));
      found.push(after);
    }
    noteRounds('store, kill -9', found);
  });

  test('outlives a power cut in which everything not synced is lost', async () => {
    const powerCutLibrary = buildPowerCutLibrary(temporary.folder);
    const found: AfterCrash[] = [];
    for (let round = 0; round < rounds; round += 1) {
      const after = await crashOnce({
        folder: temporary.folder,
        synchronous: 'FULL',
        acknowledgements: acknowledgementsOf(round),
        powerCutLibrary,
      });
      expect(after).toMatchObject({ lost: [], integrity: 'ok', isHalfApplied: false });
      found.push(after);
    }
    noteRounds('store, power cut', found);
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
