import { at, aWireStep, aWireTurn, ms, pushPullPlan, withDone } from '../testing/a-wire-turn';
import { controlsBar, nextArrivalAsEngineer } from './controls';
import type { NextAct } from './next-act';

const { steps } = pushPullPlan;
const engineer = { crew: [{ as: 'engineer' as const, personId: 'p-lind', name: 'Lindqvist' }] };
const act = (key: string): NextAct => ({ kind: 'step', step: aWireStep(key) });
const ask = (
  turn: ReturnType<typeof aWireTurn>,
  key: string,
  personId = 'p-lind',
  nextArrivalAt: number | null = null,
) => controlsBar({ turn, steps, personId, act: act(key), now: ms('17:35'), nextArrivalAt });
const inCab = withDone(aWireTurn(engineer), { 'engineer-in-cab': '17:34:38' });

describe('the engineer’s own phone', () => {
  it('records steps while the engineer is off the controls', () => {
    expect(ask(aWireTurn(engineer), 'ends-changed')).toBeNull();
  });

  it('never records being in the leaving cab nor the running test', () => {
    expect(ask(aWireTurn(engineer), 'engineer-in-cab')).toEqual({ kind: 'own-act' });
    expect(ask(aWireTurn(engineer), 'running-test')).toEqual({ kind: 'own-act' });
  });

  it('records nothing from the leaving cab on, and says since when and by whom that is known', () => {
    expect(ask(inCab, 'brakes-released')).toEqual({
      kind: 'at-controls',
      since: ms('17:34:38'),
      by: 'Ortiz',
    });
  });

  it('records again after the next arrival', () => {
    expect(ask(inCab, 'brakes-released', 'p-lind', ms('17:34:50'))).toBeNull();
  });

  it('does not bar the conductor of the turn, nor somebody who only looks on', () => {
    expect(ask(inCab, 'running-test', 'p-ortiz')).toBeNull();
  });

  it('finds the next arrival among the engineer’s own turns only', () => {
    const inbound = (clock: string) => ({
      train: '1749',
      scheduledArrivalAt: at(clock),
      expectedArrivalAt: null,
      actualArrivalAt: at(clock),
    });
    const own = aWireTurn({ ...engineer, id: 'own', inbound: inbound('18:25') });
    const foreign = aWireTurn({ id: 'foreign', inbound: inbound('18:00') });
    const before = aWireTurn({ ...engineer, id: 'before', inbound: inbound('16:00') });
    expect(nextArrivalAsEngineer([inCab, own, foreign, before], 'p-lind', inCab)).toBe(ms('18:25'));
    expect(nextArrivalAsEngineer([inCab, foreign], 'p-lind', inCab)).toBeNull();
  });
});
