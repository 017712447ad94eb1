import type { Entry } from '@stubpost/shared';
import {
  aWireAlert,
  aWireTurn,
  clockAt,
  entryAt,
  fixedSettings,
  wirePlan,
  type WireTurnParts,
} from '../../../testing/wire-turn';
import { turnAt } from '../../../lib/turn/turn-at';
import { stepColumns } from './step-columns';
import { tableRow } from './table-cells';

const steps = wirePlan.steps.map((step) => step.key);
const tracks = [{ label: '3', cars: 10, markers: [{ cars: 5, label: 'E' }] }];
const turnOf = (clock: string, parts: WireTurnParts) => {
  const now = clockAt(clock);
  return turnAt(aWireTurn(parts, now), { plan: wirePlan, settings: fixedSettings }, now);
};
const rowOf = (clock: string, parts: WireTurnParts = {}, clashesWith: string[] = []) => {
  const turn = turnOf(clock, parts);
  const stepKeys = stepColumns([turn]).map((column) => column.key);
  return tableRow(turn, { now: clockAt(clock), tracks, stepKeys, me: 'R. Hallam', clashesWith });
};
const done = (...clocks: string[]): Entry[] =>
  clocks.map((clock, index) => entryAt('step-done', clock, { step: steps[index] ?? '' }));
const arrived = entryAt('arrival', '17:04:10');

describe('columns of steps', () => {
  it('are those that hold the departure, from the arrival first', () => {
    expect(stepColumns([turnOf('17:00', {})]).map((column) => column.shortLabel)).toEqual([
      'Handbrake set',
      'Cab brake check',
      'Ends changed',
      'In leaving cab',
      'Handbrake off',
      'Air charged',
      'Leaving-end test',
    ]);
  });

  it('keep their order when the first turn has only a part of the plan', () => {
    const firstOut = turnOf('17:00', {
      planned: { kind: 'first-out', inboundTrain: null, scheduledArrivalAt: null },
    });
    const keys = stepColumns([firstOut, turnOf('17:00', {})]).map((column) => column.key);
    expect(keys).toEqual(steps.filter((key) => key !== 'running-test'));
  });
});

describe('a row of the table', () => {
  it('of a turn on plan says what is done, what is due and when it will be ready', () => {
    const row = rowOf('17:08', { entries: [arrived, ...done('17:05:30')] });
    expect(row).toMatchObject({
      look: 'standing',
      track: '3',
      train: { text: '1742', small: 'in 1741' },
      leaves: { text: '17:20' },
      plan: { flag: null, text: 'On plan' },
      state: { text: 'Secured', small: '1 of 7 done' },
      set: { text: '41', small: '5 cars' },
      marker: { text: 'E', small: '10 fit' },
      arrived: { text: '17:04:10', small: 'sched 17:00' },
      conductor: { text: 'Tolland', small: 'heard 17:05:32' },
    });
    expect(row.steps[0]).toMatchObject({
      text: '17:05:30',
      mark: 'mark securement done',
      small: 'due 17:06',
    });
    expect(row.steps[1]).toMatchObject({ estimate: true, small: 'due 17:10' });
    expect(row.ready).toMatchObject({ estimate: true });
  });

  it('of a short turn gives the expected departure and who has the alert', () => {
    const entries = [arrived, ...done('17:05:30'), entryAt('note', '17:13', { note: 'x' })];
    const raised = rowOf('17:14:30', { entries, alerts: [aWireAlert()] });
    expect(raised).toMatchObject({
      untaken: true,
      plan: { flag: 'short', text: 'Short', small: 'Act soon, ', owed: 'not taken' },
      leaves: { smallEstimate: true },
    });
    const taken = aWireAlert({
      state: 'taken',
      takenBy: 'R. Hallam',
      takenAt: new Date(clockAt('17:14')).toISOString(),
    });
    expect(rowOf('17:14:30', { entries, alerts: [taken] }).plan).toMatchObject({
      small: 'Act soon, you 17:14',
      owed: '',
    });
  });

  it('of a late turn that is ready shows no figure of time to spare', () => {
    const all = done('17:05', '17:06', '17:09', '17:15', '17:16', '17:17', '17:18');
    const row = rowOf('17:21:30', { entries: [arrived, ...all, entryAt('note', '17:21', { note: 'x' })] });
    expect([row.plan.text, row.spare, row.state.text]).toEqual(['Late 1 min', '–', 'Ready']);
    expect(row.ready).toEqual({ text: '17:18:00', small: 'is ready' });
  });

  it('of a train that left says when, and when its running test is due', () => {
    const row = rowOf('17:22', { entries: [arrived, ...done('17:05:30'), entryAt('departure', '17:21:10')] });
    expect(row).toMatchObject({
      look: 'over',
      leaves: { text: '17:21:10', small: 'sched 17:20' },
      spare: '–',
    });
    expect(row.steps[1]).toMatchObject({ text: 'no record' });
  });

  it('of a blue signal, a hold, a clash and an annulment says so', () => {
    const blue = entryAt('blue-signal-up', '17:06', { by: { personId: 'i', name: 'J. Abara' } });
    expect(rowOf('17:07', { entries: [arrived, blue] }).plan).toMatchObject({
      flag: 'blue-signal',
      small: 'since 17:06, Abara',
    });
    const hold = entryAt('hold', '17:06', { until: clockAt('17:26'), reason: 'connection' });
    expect(rowOf('17:07', { entries: [arrived, hold] }).leaves).toEqual({
      text: '17:20',
      small: 'held to 17:26',
    });
    expect(rowOf('17:05', { entries: [arrived] }, ['1756']).plan.small).toBe('same track as 1756');
    const annulled = rowOf('17:00', { entries: [entryAt('annulled', '16:55', { reason: 'no crew' })] });
    expect([annulled.look, annulled.state.small, annulled.steps[0]?.text]).toEqual([
      'annulled',
      '16:55, no crew',
      '–',
    ]);
  });

  it('of a turn far off has only what is due', () => {
    const row = rowOf('16:00');
    expect(row.steps[0]).toMatchObject({ mark: null, text: '', small: 'due 17:02' });
    expect(row.arrived).toEqual({ text: '–', small: 'sched 17:00' });
  });
});
