import { cpSync, mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { SchedulerRegistry } from '@nestjs/schedule';
import {
  dutyRosterSchema,
  messageBoxesSchema,
  type WireBoxItem,
  type WireDutyRoster,
  type WireMessageBoxes,
  type WireTaking,
} from '@stubpost/shared';
import supertest from 'supertest';
import { Reader } from '../src/database/reader';
import { BoxFolder, type BoxItem } from '../src/messages/box-folder';
import { LocalBoxes } from '../src/messages/local-boxes';
import { MailChannel } from '../src/messages/mail.channel';
import { MessageSendingJob, messageSendingTimer } from '../src/messages/message-sending.job';
import { SmsChannel } from '../src/messages/sms.channel';
import { PeopleService } from '../src/people/people.service';
import { SweepHeartbeat } from '../src/health/sweep-heartbeat';
import { SweepWatchdog } from '../src/health/sweep-watchdog';
import {
  type Railroad,
  aRailroad,
  addHarbor,
  alertsOf,
  anEntryRequest,
  at,
  openTurn,
  passTo,
  record,
  startOfTest,
} from './support/railroad';
import { type SignedInAgent, signInAs } from './support/sign-in';

let railroad: Railroad;
const copies: string[] = [];

beforeEach(async () => {
  railroad = await aRailroad();
  railroad.app.get(SchedulerRegistry).deleteInterval(messageSendingTimer);
  await addHarbor(railroad.app);
  await givePhones();
});
afterEach(async () => {
  jest.restoreAllMocks();
  await railroad.close();
  for (const folder of copies.splice(0)) rmSync(folder, { recursive: true, force: true });
});

let administrator: SignedInAgent;

/** A dispatcher with a telephone is on the desk, a supervisor stands behind. */
async function givePhones(): Promise<void> {
  administrator = await signInAs(railroad.app, 'administrator');
  for (const [role, phone] of [
    ['dispatcher', '+1 (555) 010-0001'],
    ['supervisor', '+1 (555) 010-0002'],
  ] as const) {
    const { personId } = await railroad.as(role);
    await administrator.agent.put(`/api/people/${personId}`).send({ phone }).expect(200);
  }
}

async function putRoster(fields: Partial<Record<'shifts' | 'quietHours' | 'steps', unknown[]>> = {}) {
  const supervisor = await railroad.as('supervisor');
  const before = (await supervisor.agent.get('/api/terminals/HBR/duty-roster').expect(200))
    .body as WireDutyRoster;
  const { personId } = await railroad.as('dispatcher');
  const { version, steps } = before;
  const shifts = [{ personId, as: 'desk', from: at(-3600), until: at(3600) }];
  return supervisor.agent
    .put('/api/terminals/HBR/duty-roster')
    .send({ version, shifts, quietHours: [], steps, ...fields });
}

/** A train that stands unsecured: *Act now*, at once. */
async function anUnsecuredTrain(train = '1742'): Promise<void> {
  const turn = await openTurn(await railroad.as('dispatcher'), { layoverSeconds: 3600, train });
  await record(await railroad.as('conductor'), turn.id, anEntryRequest('arrival', 0));
  await record(
    await railroad.as('dispatcher'),
    turn.id,
    anEntryRequest('step-done', 1, { step: 'ends-changed' }),
  );
  await passTo(railroad, 5);
  expect((await alertsOf(railroad)).map(({ cause }) => cause)).toEqual(['unsecured']);
}

const send = (of: Railroad = railroad) => of.app.get(MessageSendingJob).tick();
const boxes = (of: Railroad = railroad): Promise<BoxItem[]> => of.app.get(BoxFolder).list();
const summary = (items: readonly (BoxItem | WireBoxItem)[]) =>
  items.map(({ channel, to }) => `${channel} ${to}`).sort();

async function seen(): Promise<WireMessageBoxes> {
  return (await administrator.agent.get('/api/messages').expect(200)).body as WireMessageBoxes;
}

const tokenIn = (text: string): string => /\/t\/([\w-]{22})/.exec(text)?.[1] ?? 'none';

/** The data folder as a power cut at this moment would leave it, with a service started on it. */
async function afterCrash(): Promise<Railroad> {
  const dataDir = mkdtempSync(path.join(os.tmpdir(), 'stubpost-crash-'));
  copies.push(dataDir);
  cpSync(railroad.dataDir, dataDir, { recursive: true });
  const revived = await aRailroad({ dataDir, at: railroad.clock.now() });
  revived.app.get(SchedulerRegistry).deleteInterval(messageSendingTimer);
  return revived;
}

describe('an alert that is raised', () => {
  test('is told to the desk by mail and text message, and climbs by the clock until somebody takes it', async () => {
    await putRoster().then((answer) => expect(answer.status).toBe(200));
    await anUnsecuredTrain();
    await send();
    const desk = (await railroad.as('dispatcher')).name.replace(' ', '-');
    expect(summary(await boxes())).toEqual([`e-mail ${desk}@example.org`, 'sms +15550100001']);
    const [mail] = (await boxes()).filter(({ channel }) => channel === 'e-mail');
    expect(mail?.subject).toMatch(/^ACT NOW 17:20 Harbor Trk 3 train 1742: No handbrake recorded/);
    expect(mail?.text).toContain('To do: Send somebody to the train.');
    const [sms] = (await boxes()).filter(({ channel }) => channel === 'sms');
    expect(sms?.text.length).toBeLessThanOrEqual(160);
    expect(tokenIn(sms?.text ?? '')).toBe(tokenIn(mail?.text ?? 'no mail'));
    // No deputy is on: the step of 60 s goes on to the supervisor.
    await passTo(railroad, 60);
    await send();
    expect(await boxes()).toHaveLength(2);
    await passTo(railroad, 70);
    await send();
    expect(summary(await boxes())).toContain('sms +15550100002');
    const [alert] = await alertsOf(railroad);
    await (await railroad.as('dispatcher')).agent.post(`/api/alerts/${alert?.id}/taking`).expect(200);
    await send();
    const outcome = (await boxes()).filter(({ subject }) => subject.endsWith(']'));
    expect(outcome.map(({ subject }) => subject)).toEqual([
      expect.stringMatching(/^ACT NOW 17:20 Harbor Trk 3 train 1742: .* \[taken by dispatcher \d+ 17:21\]$/),
    ]);
    const root = `<alert-${alert?.id}@`;
    for (const { raw } of (await boxes()).filter(({ channel }) => channel === 'e-mail')) {
      expect(raw).toContain(`References: ${root}`);
    }
    const page = await seen();
    expect(messageBoxesSchema.parse(page)).toEqual(page);
    expect(page.local).toEqual(['e-mail', 'sms']);
    expect(
      page.messages.every(({ state, tries }) => state === 'sent' && tries[0]?.outcome === 'accepted'),
    ).toBe(true);
  });

  test('loses nothing and sends nothing twice while nobody answers for ten minutes', async () => {
    await putRoster();
    await railroad.app.get(LocalBoxes).close();
    await anUnsecuredTrain();
    for (let second = 10; second <= 605; second += 5) {
      await passTo(railroad, second);
      await send();
    }
    expect(await boxes()).toEqual([]);
    const waiting = (await seen()).messages;
    expect(waiting.length).toBeGreaterThanOrEqual(4);
    expect(waiting.map(({ state }) => state)).toEqual(waiting.map(() => 'waiting'));
    const first = waiting.at(-1);
    expect(first?.tries.length).toBeGreaterThanOrEqual(6);
    expect(first?.tries.every(({ outcome, detail }) => outcome === 'failed' && detail !== '')).toBe(true);
    await railroad.app.get(LocalBoxes).open();
    for (let second = 610; second <= 1300; second += 30) {
      await passTo(railroad, second);
      await send();
    }
    const arrived = await boxes();
    expect(arrived).toHaveLength(waiting.length);
    expect(new Set(arrived.map(({ channel, to, text }) => `${channel} ${to} ${text}`)).size).toBe(
      waiting.length,
    );
    expect((await seen()).messages.map(({ state }) => state)).toEqual(waiting.map(() => 'sent'));
  });

  test.each([
    ['a line end', '17\r\nBcc: everybody@evil.example\r\n\r\nhttp://evil.example'],
    ['quotes and marks', `"17" <'x'>@evil.example`],
  ])('carries a name with %s as plain words', async (_title, name) => {
    const { id } = await railroad.app.get(PeopleService).add({
      email: 'night@example.org',
      name,
      roles: [{ role: 'dispatcher', terminal: 'HBR' }],
    });
    await putRoster({ shifts: [{ personId: id, as: 'desk', from: at(-3600), until: at(3600) }] });
    await anUnsecuredTrain(name.slice(0, 20));
    await send();
    const mails = (await boxes()).filter(({ channel }) => channel === 'e-mail');
    expect(mails.map(({ to }) => to)).toEqual(['night@example.org']);
    const [head = ''] = mails[0]?.raw.split('\r\n\r\n') ?? [];
    expect(head).not.toMatch(/^bcc:/im);
    expect(head.match(/^to:/gim)).toHaveLength(1);
    expect(mails[0]?.text.match(/https?:\/\/\S+/g)).toHaveLength(2);
    expect(mails[0]?.raw).not.toMatch(/<a href="(?!http:\/\/127\.0\.0\.1)/);
    for (const link of mails[0]?.text.match(/https?:\/\/\S+/g) ?? [])
      expect(link).toMatch(/^http:\/\/127\.0\.0\.1:4600\//);
  });
});

describe('a crash', () => {
  test('between raising and sending leaves exactly one message in the end', async () => {
    await putRoster();
    jest.spyOn(MessageSendingJob.prototype, 'tick').mockResolvedValue();
    await anUnsecuredTrain();
    expect(await boxes()).toEqual([]);
    jest.restoreAllMocks();
    const revived = await afterCrash();
    await send(revived);
    await send(revived);
    expect(await boxes(revived)).toHaveLength(2);
    await revived.close();
  });

  test('after the other side has accepted and before that is written down leaves exactly one as well', async () => {
    await putRoster();
    const accepted = [MailChannel, SmsChannel].map((channel) => {
      const spied = railroad.app.get<MailChannel | SmsChannel>(channel);
      const original = spied.send.bind(spied);
      return new Promise<void>((resolve) => {
        jest.spyOn(spied, 'send').mockImplementation(async (message) => {
          await original(message);
          resolve();
          return new Promise(() => undefined);
        });
      });
    });
    await anUnsecuredTrain();
    await Promise.all(accepted);
    expect(await boxes()).toHaveLength(2);
    expect((await seen()).messages.map(({ state }) => state)).toEqual(['claimed', 'claimed']);
    const revived = await afterCrash();
    await send(revived);
    await send(revived);
    expect(await boxes(revived)).toHaveLength(2);
    const { agent } = await signInAs(revived.app, 'administrator');
    const { messages } = (await agent.get('/api/messages').expect(200)).body as WireMessageBoxes;
    const outcomes = messages.map(({ channel, state, tries }) => [
      channel,
      state,
      ...tries.map(({ outcome }) => outcome),
    ]);
    expect(outcomes.sort()).toEqual([
      ['e-mail', 'sent', 'cut-off', 'accepted'],
      ['sms', 'sent', 'found-accepted'],
    ]);
    await revived.close();
    // The sends that never end would hold the stopping service up.
    Object.assign(railroad.app.get(MessageSendingJob), { last: Promise.resolve() });
  });
});

describe('the link in a message', () => {
  async function aLink(): Promise<string> {
    await putRoster();
    await anUnsecuredTrain();
    await send();
    return tokenIn((await boxes())[0]?.text ?? '');
  }
  const visitor = () => supertest(railroad.app.getHttpServer());

  test('changes nothing when it is opened, and takes the alert once for its person', async () => {
    const token = await aLink();
    for (let look = 0; look < 3; look += 1) {
      const taking = (await visitor().get(`/api/takings/${token}`).expect(200)).body as WireTaking;
      expect(taking).toMatchObject({ priority: 'act-now', subject: 'Track 3, train 1742', takenBy: null });
    }
    expect(await alertsOf(railroad)).toMatchObject([{ state: 'raised', takenBy: null }]);
    const both = await Promise.all([1, 2].map(() => visitor().post(`/api/takings/${token}`)));
    expect(both.map(({ status }) => status).sort()).toEqual([200, 404]);
    const { name } = await railroad.as('dispatcher');
    expect(await alertsOf(railroad)).toMatchObject([{ state: 'taken', takenBy: name }]);
    await visitor().get(`/api/takings/${token}`).expect(404);
  });

  test('works for two hours, not with another token, and not once the person has gone', async () => {
    const token = await aLink();
    await visitor().get('/api/takings/AAAAAAAAAAAAAAAAAAAAAA').expect(404);
    railroad.clock.set(startOfTest + (2 * 3600 + 4) * 1000);
    await visitor().get(`/api/takings/${token}`).expect(200);
    railroad.clock.set(startOfTest + (2 * 3600 + 5) * 1000);
    const late = await visitor().post(`/api/takings/${token}`).expect(404);
    expect(late.body).toMatchObject({ code: 'alert.link_unknown' });
    railroad.clock.set(startOfTest + 10_000);
    const { personId } = await railroad.as('dispatcher');
    const { agent } = administrator;
    await agent.put(`/api/people/${personId}`).send({ roles: [] }).expect(200);
    await visitor().post(`/api/takings/${token}`).expect(403);
    await agent.put(`/api/people/${personId}`).send({ active: false }).expect(200);
    await visitor().post(`/api/takings/${token}`).expect(404);
  });

  test('is kept as a hash only', async () => {
    const token = await aLink();
    expect(JSON.stringify(await seen().then(({ messages }) => messages))).not.toContain(token);
    const rows = await railroad.app.get(Reader).query('SELECT * FROM taken_link, message');
    expect(JSON.stringify(rows)).not.toContain(token);
  });
});

describe('the duty roster', () => {
  test('is read by the desk, changed by the supervisor who saw the newest', async () => {
    const changed = await putRoster();
    expect(dutyRosterSchema.parse(changed.body)).toEqual(changed.body);
    expect(changed.body).toMatchObject({ version: 1, shifts: [{ as: 'desk', from: at(-3600) }] });
    const { agent } = await railroad.as('supervisor');
    const stale = { version: 0, shifts: [], quietHours: [], steps: [] };
    await agent.put('/api/terminals/HBR/duty-roster').send(stale).expect(412);
    await agent.get('/api/terminals/NONE/duty-roster').expect(403);
  });

  test('refuses people who may not act on alerts, shifts the wrong way round or too long, and times that are none', async () => {
    const shift = { personId: 'x', as: 'desk', from: at(0), until: at(60) };
    for (const fields of [
      { shifts: [{ ...shift, personId: administrator.personId }] },
      { shifts: [{ ...shift, from: at(60), until: at(0) }] },
      { shifts: [{ ...shift, until: at(172_800) }] },
      { quietHours: [{ personId: 'x', from: '25:00', until: '06:00' }] },
    ]) {
      const answer = await putRoster(fields);
      expect([fields, answer.status]).toEqual([fields, 400]);
    }
  });
});

describe('a silent sweep', () => {
  test('is told by a timer of its own, once each, and so is its end', async () => {
    const watchdog = railroad.app.get(SweepWatchdog);
    const heartbeat = railroad.app.get(SweepHeartbeat);
    heartbeat.beat();
    await watchdog.look();
    railroad.clock.advance(90);
    await watchdog.look();
    expect(await boxes()).toEqual([]);
    railroad.clock.advance(1);
    const health = await supertest(railroad.app.getHttpServer()).get('/api/health').expect(503);
    expect(health.body).toMatchObject({ problems: ['the alert sweep is silent'] });
    await railroad.app.get(LocalBoxes).close();
    await watchdog.look();
    expect(await boxes()).toEqual([]);
    await railroad.app.get(LocalBoxes).open();
    await watchdog.look();
    await watchdog.look();
    const silent = await boxes();
    expect(silent.map(({ channel }) => channel).sort()).toEqual(['e-mail', 'e-mail', 'sms']);
    expect(silent[0]?.text).toMatch(/no sweep since 22:20:00 UTC|No alert sweep since 22:20:00 UTC/);
    heartbeat.beat();
    await watchdog.look();
    await watchdog.look();
    expect(await boxes()).toHaveLength(6);
  });
});
