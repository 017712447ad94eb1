import { shippedThresholds, type WireTerminal, type WireTerminalSettings } from '@stubpost/shared';
import { type Change, ChangeFeed } from '../src/database/change-log';
import { UnitOfWork } from '../src/database/unit-of-work';
import { TerminalsReadModel } from '../src/terminals/terminals.read-model';
import { TerminalsService } from '../src/terminals/terminals.service';
import { bootApp, type Booted } from './support/boot';
import { signIn } from './support/sign-in';

let booted: Booted;
let admin: Awaited<ReturnType<typeof signIn>>;

beforeEach(async () => {
  booted = await bootApp();
  admin = await signIn(booted.app, 'administrator');
});
afterEach(() => booted.close());

const harbor = { code: 'HBR', name: 'Harbor', zone: 'America/New_York' };

describe('terminals', () => {
  test('are added once by code, in a zone that exists', async () => {
    const answer = await admin.post('/api/terminals').send(harbor).expect(201);
    expect(answer.body).toMatchObject({ ...harbor, version: 1, tracks: [] });
    const again = await admin
      .post('/api/terminals')
      .send({ ...harbor, name: 'Other' })
      .expect(409);
    expect(again.body).toMatchObject({ code: 'terminal.exists', facts: { terminal: 'HBR' } });
    const nowhere = await admin
      .post('/api/terminals')
      .send({ ...harbor, code: 'X', zone: 'America/Nowhere' });
    expect(nowhere.status).toBe(400);
    expect(nowhere.body).toMatchObject({ code: 'terminal.zone_unknown' });
  });

  test('get their tracks replaced, with stopping markers, in the order given', async () => {
    await admin.post('/api/terminals').send(harbor).expect(201);
    const tracks = [
      { label: '2', lengthFeet: 850, cars: 9, gradePercent: 0.3, markers: [{ cars: 6, label: '6' }] },
      { label: '1', markers: [{ cars: 4, label: '4L', direction: 'locomotive-at-post' }] },
    ];
    const answer = await admin.put('/api/terminals/HBR/tracks').send(tracks).expect(200);
    expect((answer.body as WireTerminal).tracks).toEqual(tracks);
    await admin
      .put('/api/terminals/HBR/tracks')
      .send({ tracks: [{ label: '3' }] })
      .expect(200);
    const list = await admin.get('/api/terminals').expect(200);
    expect((list.body as WireTerminal[])[0]).toMatchObject({ version: 3, tracks: [{ label: '3' }] });
  });

  test.each([
    ['one label twice', [{ label: '1' }, { label: ' 1 ' }], 'terminal.track_twice'],
    ['a length below zero', [{ label: '1', lengthFeet: -5 }], 'request.invalid'],
    ['a field nobody knows', [{ label: '1', color: 'red' }], 'request.invalid'],
  ])('refuse tracks with %s', async (_name, tracks, code) => {
    await admin.post('/api/terminals').send(harbor).expect(201);
    const answer = await admin.put('/api/terminals/HBR/tracks').send(tracks).expect(400);
    expect(answer.body).toMatchObject({ code });
  });

  test('that are not there are 404', async () => {
    const answer = await admin.put('/api/terminals/XYZ/tracks').send([]).expect(404);
    expect(answer.body).toMatchObject({ code: 'terminal.unknown' });
    await admin.get('/api/terminals/XYZ/settings').expect(404);
  });

  test('tell that they changed', async () => {
    const told: Change[] = [];
    booted.app.get(ChangeFeed).changes.subscribe((change) => told.push(change));
    await admin.post('/api/terminals').send(harbor).expect(201);
    await admin
      .put('/api/terminals/HBR/tracks')
      .send([{ label: '1' }])
      .expect(200);
    expect(told.map(({ kind, version, terminalCode }) => ({ kind, version, terminalCode }))).toEqual([
      { kind: 'terminal', version: 1, terminalCode: 'HBR' },
      { kind: 'terminal', version: 2, terminalCode: 'HBR' },
    ]);
  });

  test('get missing tracks added behind the ones they have', async () => {
    const terminals = booted.app.get(TerminalsService);
    await terminals.add(harbor);
    await terminals.replaceTracks('HBR', [{ label: '1', cars: 6 }]);
    await booted.app.get(UnitOfWork).run((tx) => terminals.ensureTracksIn(tx, 'HBR', ['7', '1', '5', '7']));
    const { tracks } = await booted.app.get(TerminalsReadModel).require('HBR');
    expect(tracks).toEqual([{ label: '1', cars: 6 }, { label: '7' }, { label: '5' }]);
  });
});

describe('settings of a terminal', () => {
  beforeEach(() => booted.app.get(TerminalsService).add(harbor));

  test('are the shipped ones until a supervisor of the terminal changes them', async () => {
    const supervisor = await signIn(booted.app, 'supervisor', 'HBR');
    const shipped = (await supervisor.get('/api/terminals/HBR/settings').expect(200))
      .body as WireTerminalSettings;
    expect(shipped).toEqual({
      terminal: 'HBR',
      version: 0,
      thresholds: shippedThresholds,
      briefingRequired: false,
      changedAt: null,
      changedBy: null,
    });
    expect(shipped.thresholds).toMatchObject({
      onTimeSeconds: 59,
      onTimeInclusive: true,
      runningTestMinutes: 20,
      noWordMinutes: 3,
    });
    const thresholds = { ...shipped.thresholds, onTimeSeconds: 120 };
    const changed = await supervisor
      .put('/api/terminals/HBR/settings')
      .send({ version: 0, thresholds })
      .expect(200);
    expect(changed.body).toMatchObject({
      version: 1,
      thresholds,
      changedBy: expect.stringMatching('supervisor') as string,
    });
    expect(await booted.app.get(TerminalsReadModel).thresholdsOf('HBR')).toEqual(thresholds);
  });

  test('keep the briefing that is asked for until somebody says otherwise', async () => {
    const supervisor = await signIn(booted.app, 'supervisor', 'HBR');
    const put = async (body: object): Promise<WireTerminalSettings> =>
      (await supervisor.put('/api/terminals/HBR/settings').send(body).expect(200))
        .body as WireTerminalSettings;
    const thresholds = shippedThresholds;
    expect(await put({ version: 0, thresholds, briefingRequired: true })).toMatchObject({
      thresholds,
      briefingRequired: true,
    });
    expect(await put({ version: 1, thresholds })).toMatchObject({ briefingRequired: true });
    expect(await put({ version: 2, thresholds, briefingRequired: false })).toMatchObject({
      briefingRequired: false,
    });
  });

  test('changed by two at once keep the first', async () => {
    const supervisor = await signIn(booted.app, 'supervisor', '*');
    const body = { version: 0, thresholds: shippedThresholds };
    const answers = await Promise.all(
      [1, 2].map(() => supervisor.put('/api/terminals/HBR/settings').send(body)),
    );
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 412]);
  });

  test('are not the administrator’s to change', async () => {
    await admin
      .put('/api/terminals/HBR/settings')
      .send({ version: 0, thresholds: shippedThresholds })
      .expect(403);
  });
});
