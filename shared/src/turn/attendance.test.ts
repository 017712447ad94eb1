import { describe, expect, it } from 'vitest';
import { addSeconds, type Instant } from '../lib/instant';
import { defaultStepPlanSteps } from '../plan/default-step-plan';
import { stepsFor } from '../plan/steps-for-turn';
import { aStepDone, aTurn, anEntry, fixedArrival } from '../testing/builders';
import { attendanceAt, handbrakesStanding } from './attendance';
import type { Entry } from './entry';
import { turnFrom } from './evolve';
import type { PlannedTurn } from './turn';

const at = (seconds: number): Instant => addSeconds(fixedArrival, seconds);

/** Seconds after the arrival since when the train is unattended and unsecured. */
function gapsAt(seconds: number, entries: readonly Entry[], planned: Partial<PlannedTurn> = {}) {
  const turn = aTurn(planned);
  const facts = turnFrom(turn, stepsFor(defaultStepPlanSteps, turn), [anEntry('arrival'), ...entries]);
  const { unattendedSince, unsecuredSince } = attendanceAt(facts, at(seconds));
  const since = (instant: Instant | null): number | null =>
    instant === null ? null : (instant - fixedArrival) / 1000;
  return { unattended: since(unattendedSince), unsecured: since(unsecuredSince) };
}

const engineer = { personId: 'e-1', name: 'P. Varga' };
const set = aStepDone('handbrake-set', 70, { reading: { count: 2 } });
const endsChanged = aStepDone('ends-changed', 340);
const inCab = aStepDone('engineer-in-cab', 880);
const reliefWithNobody = anEntry('relief', { as: 'engineer', out: engineer, in: null, observedAt: at(200) });
const heard = anEntry('note', { observedAt: at(30) });

describe('a standing train', () => {
  it('is attended while its engineer has not changed ends', () => {
    expect(gapsAt(339, [heard])).toEqual({ unattended: null, unsecured: null });
  });

  it('is unattended from the change of ends until the engineer is in the leaving cab', () => {
    expect(gapsAt(340, [set, endsChanged])).toEqual({ unattended: 340, unsecured: null });
    expect(gapsAt(879, [set, endsChanged, inCab])).toEqual({ unattended: 340, unsecured: null });
    expect(gapsAt(880, [set, endsChanged, inCab])).toEqual({ unattended: null, unsecured: null });
  });

  it('is attended when the ends are changed and the leaving cab is manned at the same time', () => {
    const atOnce = [aStepDone('ends-changed', 340), aStepDone('engineer-in-cab', 340)];
    expect(gapsAt(341, atOnce)).toEqual({ unattended: null, unsecured: null });
  });

  it('is unsecured when it is unattended and no handbrake stands set', () => {
    expect(gapsAt(400, [endsChanged])).toEqual({ unattended: 340, unsecured: 340 });
  });

  it('was never unsecured when the handbrake record comes in late', () => {
    const late = { ...set, receivedAt: at(3000) };
    expect(gapsAt(400, [endsChanged, late])).toEqual({ unattended: 340, unsecured: null });
  });

  it('is secured from the handbrake on when that was set late', () => {
    const setLate = aStepDone('handbrake-set', 500);
    expect(gapsAt(499, [endsChanged, setLate]).unsecured).toBe(340);
    expect(gapsAt(500, [endsChanged, setLate]).unsecured).toBeNull();
  });

  it('is unsecured from the release on when the handbrakes come off with nobody there', () => {
    const released = aStepDone('handbrake-released', 600, { reading: { count: 2 } });
    expect(gapsAt(700, [set, endsChanged, released])).toEqual({ unattended: 340, unsecured: 600 });
  });

  it('is secured while one of two handbrakes stands', () => {
    const released = aStepDone('handbrake-released', 600, { reading: { count: 1 } });
    expect(gapsAt(700, [set, endsChanged, released]).unsecured).toBeNull();
  });

  it('is not unattended again by a change of ends that is said to be after the engineer was in the cab', () => {
    expect(gapsAt(900, [aStepDone('ends-changed', 890), inCab])).toEqual({
      unattended: null,
      unsecured: null,
    });
  });

  it('is attended from its departure on', () => {
    const left = anEntry('departure', { observedAt: at(1200) });
    expect(gapsAt(1199, [endsChanged, left]).unsecured).toBe(340);
    expect(gapsAt(1200, [endsChanged, left])).toEqual({ unattended: null, unsecured: null });
  });
});

describe('a crew that is relieved', () => {
  it('leaves the train unattended when nobody takes over', () => {
    expect(gapsAt(300, [heard, reliefWithNobody])).toEqual({ unattended: 200, unsecured: 200 });
  });

  it('does not when somebody does', () => {
    const taken = anEntry('relief', {
      as: 'engineer',
      out: engineer,
      in: { personId: 'e-2', name: 'K. Dahl' },
      observedAt: at(250),
    });
    expect(gapsAt(300, [heard, reliefWithNobody, taken])).toEqual({ unattended: null, unsecured: null });
  });

  it('does not when a conductor goes and the engineer stays', () => {
    const crew = anEntry('crew', { as: 'engineer', person: engineer, observedAt: at(-60) });
    const conductorGone = anEntry('relief', {
      as: 'conductor',
      out: { personId: 'c-1', name: 'R. Sato' },
      in: null,
      observedAt: at(200),
    });
    expect(gapsAt(300, [heard, crew, conductorGone]).unattended).toBeNull();
    expect(gapsAt(300, [heard, conductorGone]).unattended).toBe(200);
  });
});

describe('silence after the arrival', () => {
  it('counts as left alone 10 min after it without a handbrake and without any entry', () => {
    expect(gapsAt(599, []).unattended).toBeNull();
    expect(gapsAt(600, [])).toEqual({ unattended: 600, unsecured: 600 });
  });

  it('does not when there was any entry in that time', () => {
    expect(gapsAt(900, [heard]).unattended).toBeNull();
    expect(gapsAt(900, [anEntry('note', { observedAt: at(600) })]).unattended).toBeNull();
  });

  it('does when the first entry came later: that ends nothing', () => {
    expect(gapsAt(900, [anEntry('note', { observedAt: at(601) })]).unattended).toBe(600);
  });

  it('holds for a tie-up too, until its handbrake is recorded', () => {
    const tieUp = { kind: 'tie-up', scheduledDepartureAt: null } as const;
    expect(gapsAt(900, [], tieUp).unsecured).toBe(600);
    expect(gapsAt(900, [aStepDone('handbrake-set', 800)], tieUp).unsecured).toBeNull();
  });
});

describe('a turn whose plan secures nothing', () => {
  it('is not judged', () => {
    expect(gapsAt(900, [reliefWithNobody], { reverses: false })).toEqual({
      unattended: null,
      unsecured: null,
    });
  });
});

describe('the number of handbrakes that stand set', () => {
  it('follows the records and takes a set without a count for one', () => {
    const facts = turnFrom(aTurn(), defaultStepPlanSteps, [
      aStepDone('handbrake-set', 70),
      aStepDone('handbrake-released', 900),
    ]);
    expect([at(69), at(70), at(899), at(900)].map((now) => handbrakesStanding(facts, now))).toEqual([
      0, 1, 1, 0,
    ]);
  });
});
