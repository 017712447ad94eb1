import { seededRandom } from '@stubpost/shared/testing';
import { verdictOf } from '../support/sealed-log';
import { noteSoak } from '../support/soak-report';
import { temporaryFolder } from '../support/temporary-folder';
import { buildPowerCutLibrary } from './crash-rounds';
import {
  type AfterServerCrash,
  type CrashedServer,
  crashServerOnce,
  prepareServer,
  wholeLogOf,
} from './server-rounds';

/** Rounds of each kind; `npm run soak` asks for more. */
const killRounds = Number(process.env.KILL_ROUNDS ?? 2);
const powerCutRounds = Number(process.env.POWER_CUT_ROUNDS ?? 2);
const perRound = 30_000;

jest.setTimeout(60_000 + Math.max(killRounds, powerCutRounds) * perRound);

let temporary: ReturnType<typeof temporaryFolder>;
beforeEach(() => {
  temporary = temporaryFolder();
});
afterEach(() => temporary.remove());

/** Crashes one server over and over and gives what was found each time. */
async function crash(server: CrashedServer, rounds: number): Promise<AfterServerCrash[]> {
  const random = seededRandom(rounds);
  const found: AfterServerCrash[] = [];
  for (let round = 0; round < rounds; round += 1) {
    found.push(await crashServerOnce(server, 15 + Math.floor(random() * 120)));
  }
  return found;
}

const nothingWrong = {
  lost: [],
  notOnce: [],
  refused: [],
  integrity: 'ok',
  isChainWhole: true,
  isHalfApplied: false,
};

function expectAllKept(part: string, found: readonly AfterServerCrash[], server: CrashedServer): void {
  const sum = (of: (each: AfterServerCrash) => number) => found.reduce((total, each) => total + of(each), 0);
  const verdict = verdictOf(wholeLogOf(server.folder), [server.head]);
  noteSoak({
    part,
    rounds: found.length,
    acknowledged: sum(({ acknowledged }) => acknowledged),
    lost: sum(({ lost }) => lost.length),
    doubled: sum(({ notOnce }) => notOnce.length),
    chain: verdict.isWhole && found.every(({ isChainWhole }) => isChainWhole) ? 'whole' : 'broken',
  });
  for (const [round, each] of found.entries())
    expect({ round, ...each }).toMatchObject({ round, ...nothingWrong });
  expect(verdict).toMatchObject({ isWhole: true, entries: server.head.sequence });
}

describe('an entry with a receipt, in a server that dies under writes', () => {
  test('outlives kill -9 at any moment, once, in one whole chain', async () => {
    const server = await prepareServer(temporary.folder);
    expectAllKept('server, kill -9', await crash(server, killRounds), server);
  });

  test('outlives a power cut in which everything not synced is lost', async () => {
    const server = await prepareServer(temporary.folder);
    server.powerCutLibrary = buildPowerCutLibrary(temporary.folder);
    expectAllKept('server, power cut', await crash(server, powerCutRounds), server);
  });
});
