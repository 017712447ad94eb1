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
async function crash(part: string, server: CrashedServer, rounds: number): Promise<AfterServerCrash[]> {
  const random = seededRandom(rounds);
  const found: AfterServerCrash[] = [];
  for (let round = 0; round < rounds; round += 1) {
    const after = await crashServerOnce(server, 15 + Math.floor(random() * 120));
    const { acknowledged, lost, notOnce, isChainWhole } = after;
    const chain = isChainWhole ? 'whole' : 'broken';
    noteSoak({ part, rounds: 1, acknowledged, lost: lost.length, doubled: notOnce.length, chain });
    found.push(after);
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

function expectAllKept(found: readonly AfterServerCrash[], server: CrashedServer): void {
  for (const [round, each] of found.entries())
    expect({ round, ...each }).toMatchObject({ round, ...nothingWrong });
  const verdict = verdictOf(wholeLogOf(server.folder), [server.head]);
  expect(verdict).toMatchObject({ isWhole: true, entries: server.head.sequence });
}

describe('an entry with a receipt, in a server that dies under writes', () => {
  test('outlives kill -9 at any moment, once, in one whole chain', async () => {
    const server = await prepareServer(temporary.folder);
    expectAllKept(await crash('server, kill -9', server, killRounds), server);
  });

  test('outlives a power cut in which everything not synced is lost', async () => {
    const server = await prepareServer(temporary.folder);
    server.powerCutLibrary = buildPowerCutLibrary(temporary.folder);
    expectAllKept(await crash('server, power cut', server, powerCutRounds), server);
  });
});
