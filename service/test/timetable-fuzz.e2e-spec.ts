import { mkdirSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { railRouteTypes, type WireBoard, type WireTimetable } from '@stubpost/shared';
import { aFeed } from '@stubpost/shared/testing';
import { feedLimits } from '../src/timetables/feed-limits';
import { readFeed } from '../src/timetables/feed-reader';
import { brokenZips } from './support/broken-zips';
import { bringIn, untilRead, upload, zipOf } from './support/feed-zips';
import { aRailroad } from './support/railroad';
import { signInAs } from './support/sign-in';
import { temporaryFolder } from './support/temporary-folder';

describe('a broken zip', () => {
  test('always gives a timetable or reasons, whatever was done to it', async () => {
    const { folder, remove } = temporaryFolder();
    const request = { routeTypes: railRouteTypes, limits: feedLimits, shortestTurnSeconds: 520 };
    const outcomes = { read: 0, refused: 0 };
    mkdirSync(folder, { recursive: true });
    for (const { title, bytes } of brokenZips(400, 20260303)) {
      const file = path.join(folder, 'broken.zip');
      writeFileSync(file, bytes);
      const answer = await readFeed({ ...request, path: file }, () => undefined);
      if (answer.ok) outcomes.read += 1;
      else outcomes.refused += 1;
      const hasReason = answer.ok || answer.problems.some((problem) => problem.severity === 'refused');
      expect([title, hasReason]).toEqual([title, true]);
    }
    remove();
    // Some of the faults hit what is not read, such as the date of a file; most do not.
    expect(outcomes.read).toBeGreaterThan(25);
    expect(outcomes.refused).toBeGreaterThan(200);
  });

  test('ends refused or ready, and the running timetable stays as it was', async () => {
    const railroad = await aRailroad();
    const admin = await signInAs(railroad.app, 'administrator');
    const running = await bringIn(admin, zipOf(aFeed()));
    const terminals = [{ code: 'HBR', name: 'Harbor Terminal', stationIds: ['harbor'] }];
    await admin.agent
      .post(`/api/timetables/${running.id}/activation`)
      .send({ from: '2026-03-03', terminals })
      .expect(200);
    const look = async (): Promise<unknown> => {
      const board = await admin.agent.get('/api/board?terminal=HBR&serviceDate=2026-03-03').expect(200);
      const timetable = await admin.agent.get(`/api/timetables/${running.id}`).expect(200);
      return [(board.body as WireBoard).turns, timetable.body as WireTimetable];
    };
    const before = await look();
    for (const { title, bytes } of brokenZips(40, 4)) {
      const answer = await upload(admin, bytes);
      expect([title, [202, 422].includes(answer.status)]).toEqual([title, true]);
      if (answer.status !== 202) continue;
      const { state } = await untilRead(admin, (answer.body as { id: string }).id);
      expect([title, ['ready', 'refused'].includes(state)]).toEqual([title, true]);
    }
    expect(await look()).toEqual(before);
    await railroad.close();
  });
});
