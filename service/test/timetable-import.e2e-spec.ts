import { existsSync, readdirSync } from 'node:fs';
import path from 'node:path';
import { aFeed, type FeedTexts } from '@stubpost/shared/testing';
import type { ErrorBody, WireDerivedTurn, WireTimetable, WireTimetableHead } from '@stubpost/shared';
import { strToU8, zipSync } from 'fflate';
import { feedLimits } from '../src/timetables/feed-limits';
import { bringIn, upload, zipOf } from './support/feed-zips';
import { aRailroad, type Railroad } from './support/railroad';
import { signInAs, type SignedInAgent } from './support/sign-in';

let railroad: Railroad;
let admin: SignedInAgent;

beforeAll(async () => {
  railroad = await aRailroad();
  admin = await signInAs(railroad.app, 'administrator');
});
afterAll(() => railroad.close());

const uploads = (): string[] => readdirSync(path.join(railroad.dataDir, 'uploads', 'incoming'));

async function turnsOf(timetable: WireTimetable, serviceDate: string): Promise<WireDerivedTurn[]> {
  const answer = await admin.agent
    .get(`/api/timetables/${timetable.id}/turns?serviceDate=${serviceDate}`)
    .expect(200);
  return answer.body as WireDerivedTurn[];
}

describe('a timetable that is brought in', () => {
  test('is being read at first, then ready, with its summary', async () => {
    const answer = await upload(admin, zipOf(aFeed())).expect(202);
    expect(answer.body).toEqual({ id: expect.any(String) as string, state: 'reading' });
    const timetable = await bringIn(admin, zipOf(aFeed()));
    expect(timetable).toMatchObject({
      state: 'ready',
      fileName: 'winter.zip',
      uploadedBy: admin.name,
      routeTypes: '2,100-117',
      progress: null,
      activeFrom: null,
      problems: [],
      summary: {
        trips: 3,
        blocks: 1,
        firstDate: '2026-01-01',
        lastDate: '2026-12-31',
        zone: 'America/New_York',
        agency: 'Cove Line',
      },
    });
    const list = (await admin.agent.get('/api/timetables').expect(200)).body as WireTimetableHead[];
    expect(list.find((head) => head.id === timetable.id)).toMatchObject({
      state: 'ready',
      fileName: 'winter.zip',
    });
  });

  test('shows its turns of any day to the second', async () => {
    const timetable = await bringIn(admin, zipOf(aFeed()));
    expect(await turnsOf(timetable, '2026-03-02')).toEqual([
      {
        serviceDate: '2026-03-02',
        stationId: 'harbor',
        blockId: 'B 1',
        inboundTripId: 'T1',
        arrivalAt: '2026-03-02T11:40:00.000Z',
        outboundTripId: 'T2',
        departureAt: '2026-03-02T12:00:00.000Z',
        layoverSeconds: 1200,
        reverses: true,
        guessed: false,
      },
      expect.objectContaining({ stationId: 'stonecrop', inboundTripId: 'T2', outboundTripId: 'T3' }),
    ]);
    expect(await turnsOf(timetable, '2026-03-01')).toEqual([]);
    await admin.agent.get(`/api/timetables/${timetable.id}/turns?serviceDate=someday`).expect(400);
    await admin.agent.get(`/api/timetables/${timetable.id}/turns`).expect(400);
  });

  test('may have a byte order mark, carriage returns, quotes and line breaks inside quotes', async () => {
    const quoted = (text: string): string =>
      text
        .trim()
        .split('\n')
        .map((line) =>
          line
            .split(',')
            .map((cell) => `"${cell}"`)
            .join(','),
        )
        .join('\r\n');
    const texts = Object.fromEntries(
      Object.entries(aFeed()).map(([file, text]) => [file, `\uFEFF${quoted(text)}`]),
    );
    const stops = (texts['stops.txt'] ?? '').replace('"Harbor Terminal"', '"Harbor ""Terminal"",\nupper"');
    const timetable = await bringIn(admin, zipOf({ ...texts, 'stops.txt': stops }));
    expect(timetable.state).toBe('ready');
    expect(timetable.summary?.stations.map((station) => station.name)).toContain('Harbor "Terminal",\nupper');
    expect(await turnsOf(timetable, '2026-03-02')).toHaveLength(2);
  });

  test('names the line on which a row begins, also behind rows of several lines', async () => {
    const texts = aFeed();
    const stops = (texts['stops.txt'] ?? '')
      .replace('Mill Road,', '"Mill\n\nRoad",')
      .replace('Stonecrop,', 'Stonecrop,nowhere');
    const timetable = await bringIn(admin, zipOf({ ...texts, 'stops.txt': stops }));
    expect(timetable.problems).toEqual([
      expect.objectContaining({ file: 'stops.txt', line: 8, code: 'stop.parent_unknown' }),
    ]);
  });

  test('may lie in a folder of the zip', async () => {
    const inFolder = Object.fromEntries(
      Object.entries(aFeed()).map(([file, text]) => [`winter/gtfs/${file}`, text]),
    );
    expect((await bringIn(admin, zipOf(inFolder))).state).toBe('ready');
  });

  test('is read for other route types when told so', async () => {
    const zip = zipOf(aFeed({ routes: [['R', '1']] }));
    expect((await bringIn(admin, zip)).state).toBe('refused');
    expect((await bringIn(admin, zip, { routeTypes: '0, 1' })).state).toBe('ready');
    const answer = await upload(admin, zip, { routeTypes: 'subway' }).expect(400);
    expect((answer.body as ErrorBody).code).toBe('request.invalid');
    expect((await bringIn(admin, zipOf(aFeed()), { routeTypes: '' })).state).toBe('ready');
  });

  test('that is refused names file and line, and its zip is not kept', async () => {
    const texts = aFeed();
    const stopTimes = (texts['stop_times.txt'] ?? '').replace('07:20:00,07:20:00', '7h20,07:20:00');
    const timetable = await bringIn(admin, zipOf({ ...texts, 'stop_times.txt': stopTimes }));
    expect(timetable).toMatchObject({ state: 'refused', summary: null });
    expect(timetable.problems).toEqual([
      {
        severity: 'refused',
        file: 'stop_times.txt',
        line: 6,
        code: 'time.unreadable',
        message: '“7h20” in arrival_time is not a time like 25:35:00.',
      },
    ]);
    expect(existsSync(path.join(railroad.dataDir, 'uploads', `${timetable.id}.zip`))).toBe(false);
    const answer = await admin.agent
      .get(`/api/timetables/${timetable.id}/turns?serviceDate=2026-03-02`)
      .expect(409);
    expect(answer.body).toMatchObject({ code: 'timetable.not_ready', facts: { state: 'refused' } });
  });
});

describe('an upload is refused at once', () => {
  test('when it is no zip, and leaves nothing behind', async () => {
    const answer = await upload(admin, Buffer.from('trip_id,route_id\n')).expect(422);
    expect((answer.body as ErrorBody).code).toBe('timetable.not_a_zip');
    expect(uploads()).toEqual([]);
  });

  test('when it is larger than the limit, and leaves nothing behind', async () => {
    const answer = await upload(admin, Buffer.alloc(feedLimits.zipBytes + 1)).expect(413);
    expect(answer.body).toMatchObject({ code: 'timetable.too_large', facts: { limit: '128 MB' } });
    expect(uploads()).toEqual([]);
  });

  test('when the form has no file', async () => {
    const answer = await admin.agent.post('/api/timetables').field('routeTypes', '2').expect(400);
    expect((answer.body as ErrorBody).code).toBe('timetable.file_missing');
    const other = await admin.agent
      .post('/api/timetables')
      .attach('zip', zipOf(aFeed()), 'x.zip')
      .expect(400);
    expect((other.body as ErrorBody).code).toBe('timetable.file_missing');
    await admin.agent.post('/api/timetables').send({}).expect(400);
  });

  test('when the person may not, and before a byte of it is kept', async () => {
    const planner = await signInAs(railroad.app, 'planner');
    await upload(planner, zipOf(aFeed())).expect(403);
    expect(uploads()).toEqual([]);
    await planner.agent.get('/api/timetables').expect(200);
    const conductor = await signInAs(railroad.app, 'conductor');
    await conductor.agent.get('/api/timetables').expect(403);
  });

  test('an unknown timetable is 404 everywhere', async () => {
    await admin.agent.get('/api/timetables/unknown').expect(404);
    await admin.agent.get('/api/timetables/unknown/turns?serviceDate=2026-03-02').expect(404);
    await admin.agent.get('/api/timetables/unknown/difference').expect(404);
    await admin.agent.post('/api/timetables/unknown/roll-back').expect(404);
  });
});

describe('a zip is refused after reading', () => {
  const raw = (files: Record<string, Uint8Array>): Buffer => Buffer.from(zipSync(files, { level: 9 }));
  const packed = (texts: FeedTexts): Record<string, Uint8Array> =>
    Object.fromEntries(Object.entries(texts).map(([name, text]) => [name, strToU8(text)]));
  const codesOf = async (zip: Buffer): Promise<string[]> => {
    const timetable = await bringIn(admin, zip);
    expect(timetable.state).toBe('refused');
    return timetable.problems.map((problem) => `${problem.file ?? ''} ${problem.code}`);
  };

  test('when a file becomes far larger than it is packed', async () => {
    const bomb = new Uint8Array(feedLimits.ratioFreeBytes + 1).fill(32);
    expect(await codesOf(raw({ ...packed(aFeed()), 'stop_times.txt': bomb }))).toEqual([
      'stop_times.txt limit.ratio',
    ]);
  });

  test('when it holds too many files', async () => {
    const many = Object.fromEntries(
      Array.from({ length: feedLimits.entries + 1 }, (_, index) => [`${index}.txt`, new Uint8Array()]),
    );
    expect(await codesOf(raw(many))).toEqual([' limit.files']);
  });

  test.each(['../trips.txt', '/etc/trips.txt', 'a/../../trips.txt', 'C:/trips.txt'])(
    'when a name in it is %s, and nothing is written there',
    async (name) => {
      expect(await codesOf(raw({ ...packed(aFeed()), [name]: strToU8('x') }))).toEqual([' zip.damaged']);
    },
  );

  test('when a row is longer than any row can be', async () => {
    const long = `${aFeed()['stops.txt'] ?? ''}x,"${'y'.repeat(feedLimits.rowCharacters + 10)}"\n`;
    expect(await codesOf(zipOf({ ...aFeed(), 'stops.txt': long }))).toEqual(['stops.txt file.unreadable']);
  });

  test('when a quotation mark is never closed', async () => {
    const open = (aFeed()['trips.txt'] ?? '').replace('T2,', '"T2,');
    expect(await codesOf(zipOf({ ...aFeed(), 'trips.txt': open }))).toEqual(['trips.txt file.unreadable']);
  });

  test('when a file in it is empty, or something quite different', async () => {
    expect(await codesOf(zipOf({ ...aFeed(), 'agency.txt': '' }))).toContain(
      'agency.txt file.column_missing',
    );
    const noise = Uint8Array.from({ length: 5000 }, (_, index) => (index * 7919) % 256);
    expect(await codesOf(raw({ ...packed(aFeed()), 'routes.txt': noise }))).toContain(
      'routes.txt file.column_missing',
    );
  });

  test('when it holds no timetable at all', async () => {
    const codes = await codesOf(zipOf({ 'readme.md': 'hello' }));
    expect(codes).toContain('agency.txt file.missing');
    expect(codes).toContain('stop_times.txt file.missing');
  });
});
