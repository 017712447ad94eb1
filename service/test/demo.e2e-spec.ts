import { existsSync } from 'node:fs';
import path from 'node:path';
import type { WireDemo } from '@stubpost/shared';
import supertest from 'supertest';
import { DemoService } from '../src/demo/demo.service';
import { readyDemo } from '../src/demo/start-demo';
import { Restarter } from '../src/common/restarter';
import { Installation } from '../src/database/installation';
import { bootApp, type Booted } from './support/boot';
import { signInAs } from './support/sign-in';

let booted: Booted;
afterEach(() => booted.close());
const ask = () => supertest(booted.app.getHttpServer());

describe('a demo', () => {
  beforeEach(async () => {
    booted = await bootApp({ environment: { DEMO: 'live' } });
    await booted.app.get(DemoService).begin();
  });

  test('says so, how far it is filled, and whom one can be', async () => {
    booted.app.get(DemoService).report({ state: 'filling', message: 'Day 3 of 56' });
    const conductor = await signInAs(booted.app, 'conductor');
    const administrator = await signInAs(booted.app, 'administrator');
    await signInAs(booted.app, 'conductor');
    const answer = (await ask().get('/api/demo').expect(200)).body as WireDemo;
    expect(answer).toEqual({
      demo: true,
      state: 'filling',
      message: 'Day 3 of 56',
      people: [
        { id: conductor.personId, name: conductor.name, role: 'conductor', terminal: '*' },
        { id: administrator.personId, name: administrator.name, role: 'administrator', terminal: '*' },
      ],
    });
  });

  test('signs in with one click as those it offers, and nobody else', async () => {
    const offered = await signInAs(booted.app, 'conductor');
    const other = await signInAs(booted.app, 'conductor');
    const answer = await ask().post('/api/demo/session').send({ personId: offered.personId }).expect(200);
    expect(answer.body).toMatchObject({ person: { name: offered.name } });
    await ask().post('/api/demo/session').send({ personId: other.personId }).expect(404);
  });

  test('is left for an empty database beside it, which is no demo and waits to be set up', async () => {
    const administrator = await signInAs(booted.app, 'administrator');
    let restarts = 0;
    const restarted = new Promise<void>((resolve) => {
      booted.app.get(Restarter).onRequest(() => {
        restarts += 1;
        resolve();
      });
    });
    await administrator.agent.post('/api/demo/leaving').expect(202);
    await restarted;
    expect(restarts).toBe(1);
    await booted.app.close();
    const after = await bootApp({ dataDir: booted.dataDir, environment: { DEMO: 'live' } });
    const server = after.app.getHttpServer();
    expect((await supertest(server).get('/api/demo').expect(200)).body).toEqual({ demo: false });
    expect((await supertest(server).get('/api/setup').expect(200)).body).toEqual({ needed: true });
    expect(await after.app.get(Installation).isDemoWanted()).toBe(false);
    expect(existsSync(path.join(booted.dataDir, 'stubpost.sqlite'))).toBe(true);
    expect(existsSync(path.join(booted.dataDir, 'railroad-1.sqlite'))).toBe(true);
    await after.close();
  });

  test('is left by administrators only', async () => {
    const { agent } = await signInAs(booted.app, 'supervisor');
    await agent.post('/api/demo/leaving').expect(403);
  });
});

describe('a database that is no demo', () => {
  beforeEach(async () => {
    booted = await bootApp({ environment: { DEMO: 'off' } });
  });

  test('offers nobody, signs nobody in with one click, and cannot be left', async () => {
    const { agent, personId } = await signInAs(booted.app, 'administrator');
    expect((await ask().get('/api/demo').expect(200)).body).toEqual({ demo: false });
    const answer = await ask().post('/api/demo/session').send({ personId }).expect(404);
    expect(answer.body).toMatchObject({ code: 'demo.off' });
    await agent.post('/api/demo/leaving').expect(404);
  });

  test('is not filled', async () => {
    expect(await readyDemo(booted.app)).toBeNull();
  });

  test('with people in it is not made a demo by a later start', async () => {
    await signInAs(booted.app, 'administrator');
    await booted.app.close();
    const again = await bootApp({ dataDir: booted.dataDir, environment: { DEMO: 'live' } });
    expect(await again.app.get(Installation).isDemoWanted()).toBe(false);
    await again.close();
  });
});
