import { SchedulerRegistry } from '@nestjs/schedule';
import { sweepSilenceSeconds } from '@stubpost/shared';
import supertest from 'supertest';
import type { DataSource } from 'typeorm';
import { FixedClock } from '../src/common/clock';
import { READER } from '../src/database/tokens';
import { TurnSweepJob, turnSweepTimer } from '../src/turns/turn-sweep.job';
import { bootApp, type Booted } from './support/boot';

describe('GET /api/health', () => {
  const startedAt = Date.parse('2026-03-03T22:00:00Z');
  let clock: FixedClock;
  let booted: Booted;

  beforeEach(async () => {
    clock = new FixedClock(startedAt);
    booted = await bootApp({ clock });
    // The sweeps of these tests are made by hand.
    booted.app.get(SchedulerRegistry).deleteInterval(turnSweepTimer);
    await booted.app.get(TurnSweepJob).tick();
  });
  afterEach(() => booted.close());

  const ask = () => supertest(booted.app.getHttpServer()).get('/api/health');

  test('says that all is well, which version runs, and when alerts were last looked for', async () => {
    clock.advance(sweepSilenceSeconds);
    const answer = await ask().expect(200);
    expect(answer.body).toEqual({
      status: 'ok',
      version: expect.stringMatching(/^\d+\.\d+\.\d+$/) as string,
      schema: expect.stringMatching(/\d{13}$/) as string,
      lastSweepAt: '2026-03-03T22:00:00.000Z',
    });
  });

  test('a database that does not answer makes the service unwell', async () => {
    await booted.app.get<DataSource>(READER).destroy();
    const answer = await ask().expect(503);
    expect(answer.body).toMatchObject({ status: 'unwell', problems: ['the database does not answer'] });
  });

  test('a sweep that fell silent makes the service unwell, and well again when it is back', async () => {
    clock.advance(sweepSilenceSeconds + 1);
    const silent = await ask().expect(503);
    expect(silent.body).toMatchObject({ status: 'unwell', problems: ['the alert sweep is silent'] });
    await booted.app.get(TurnSweepJob).tick();
    const answer = await ask().expect(200);
    expect(answer.body).toMatchObject({ lastSweepAt: new Date(clock.now()).toISOString() });
  });
});
