import { SchedulerRegistry } from '@nestjs/schedule';
import { sweepSilenceSeconds } from '@stubpost/shared';
import supertest from 'supertest';
import type { DataSource } from 'typeorm';
import { FixedClock } from '../src/common/clock';
import { READER } from '../src/database/tokens';
import { SweepHeartbeat } from '../src/health/sweep-heartbeat';
import { turnSweepTimer } from '../src/turns/turn-sweep.job';
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
  });
  afterEach(() => booted.close());

  const ask = () => supertest(booted.app.getHttpServer()).get('/api/health');

  test('a start without a sweep yet is well for a while', async () => {
    clock.advance(sweepSilenceSeconds);
    const answer = await ask().expect(200);
    expect(answer.body).toEqual({
      status: 'ok',
      version: expect.stringMatching(/^\d+\.\d+\.\d+$/) as string,
      schema: expect.stringMatching(/^Create|^Add/) as string,
      lastSweepAt: null,
    });
  });

  test('a sweep that never came makes the service unwell', async () => {
    clock.advance(sweepSilenceSeconds + 1);
    const answer = await ask().expect(503);
    expect(answer.body).toMatchObject({ status: 'unwell', problems: ['the alert sweep is silent'] });
  });

  test('a database that does not answer makes the service unwell', async () => {
    await booted.app.get<DataSource>(READER).destroy();
    const answer = await ask().expect(503);
    expect(answer.body).toMatchObject({ status: 'unwell', problems: ['the database does not answer'] });
  });

  test('a sweep that fell silent makes the service unwell, and well again when it is back', async () => {
    booted.app.get(SweepHeartbeat).beat();
    clock.advance(sweepSilenceSeconds + 1);
    await ask().expect(503);
    booted.app.get(SweepHeartbeat).beat();
    const answer = await ask().expect(200);
    expect(answer.body).toMatchObject({ lastSweepAt: new Date(clock.now()).toISOString() });
  });
});
