import { describe, expect, it } from 'vitest';
import { addSeconds } from '../lib/instant';
import { defaultStepPlanSteps } from '../plan/default-step-plan';
import { aStepDone, aTurn, anEntry, fixedArrival } from '../testing/builders';
import { wouldNeedApproval } from './approvals';
import type { Entry } from './entry';
import { turnFrom } from './evolve';
import type { TurnFacts } from './facts';

const at = (seconds: number): number => addSeconds(fixedArrival, seconds);
const supervisor = { personId: 'p-supervisor', name: 'R. Reyes' };
const other = { personId: 'p-other', name: 'A. Ortiz' };

const tick = aStepDone('cab-brake-check', 300);
const left = anEntry('departure', { observedAt: at(1205) });
const corrected = anEntry('corrected', {
  target: tick.id,
  correctedObservedAt: at(240),
  reason: 'misread',
  observedAt: at(1300),
});
const takenBack = anEntry('withdrawn', { target: tick.id, reason: 'wrong train', observedAt: at(1300) });
const approvalOf = (target: Entry, overrides = {}): Entry =>
  anEntry('correction-approved', { target: target.id, by: supervisor, observedAt: at(1500), ...overrides });
const declineOf = (target: Entry, overrides = {}): Entry =>
  anEntry('correction-declined', { target: target.id, by: supervisor, observedAt: at(1500), ...overrides });

/** The facts, the same for the order given and for the one turned round. */
function facts(...entries: Entry[]): TurnFacts {
  const given = turnFrom(aTurn(), defaultStepPlanSteps, entries);
  expect(turnFrom(aTurn(), defaultStepPlanSteps, [...entries].reverse())).toEqual(given);
  return given;
}
const checkedAt = (...entries: Entry[]): number | undefined => facts(...entries).doneAt['cab-brake-check'];

describe('a correction', () => {
  it('before the departure takes effect at once', () => {
    expect(checkedAt(tick, corrected)).toBe(at(240));
    expect(facts(tick, corrected).corrections).toEqual([]);
  });

  it('after the departure waits, changes nothing, and is named', () => {
    const found = facts(tick, left, corrected);
    expect(found.doneAt['cab-brake-check']).toBe(at(300));
    expect(found.corrections).toMatchObject([
      { what: 'cab-brake-check', oldAt: at(300), newAt: at(240), state: 'waiting', decision: null },
    ]);
    expect(found.findings.map((finding) => finding.code)).toContain('entry.correction_waiting');
  });

  it('at the very second of the departure was made before it', () => {
    expect(checkedAt(tick, left, { ...corrected, observedAt: at(1205) })).toBe(at(240));
  });

  it('takes effect when another person approves it, also where the yes came in first', () => {
    const found = facts(approvalOf(corrected), corrected, left, tick);
    expect(found.doneAt['cab-brake-check']).toBe(at(240));
    expect(found.corrections).toMatchObject([{ state: 'approved', decision: { by: supervisor } }]);
    expect(found.findings.map((finding) => finding.code)).not.toContain('entry.correction_waiting');
  });

  it('is not approved by the person who asked for it', () => {
    const own = approvalOf(corrected, { by: corrected.by });
    expect(checkedAt(tick, left, corrected, own)).toBe(at(300));
  });

  it('that was declined changes nothing and says why', () => {
    const found = facts(tick, left, corrected, declineOf(corrected, { reason: 'the event recorder agrees' }));
    expect(found.doneAt['cab-brake-check']).toBe(at(300));
    expect(found.corrections).toMatchObject([
      { state: 'declined', decision: { reason: 'the event recorder agrees' } },
    ]);
  });

  it('follows the latest of two decisions', () => {
    const later = declineOf(corrected, { observedAt: at(1600) });
    expect(checkedAt(tick, left, corrected, approvalOf(corrected), later)).toBe(at(300));
    const again = approvalOf(corrected, { observedAt: at(1700) });
    expect(checkedAt(tick, left, corrected, approvalOf(corrected), later, again)).toBe(at(240));
  });

  it('stands beside the one before it: old is what the record said until then', () => {
    const second = anEntry('corrected', {
      target: tick.id,
      correctedObservedAt: at(260),
      observedAt: at(1700),
    });
    const found = facts(tick, left, corrected, approvalOf(corrected), second);
    expect(found.corrections.map(({ oldAt, newAt }) => [oldAt, newAt])).toEqual([
      [at(300), at(240)],
      [at(240), at(260)],
    ]);
  });

  it('of the departure itself waits too, and once approved moves what "after the departure" means', () => {
    const earlier = anEntry('corrected', {
      target: left.id,
      correctedObservedAt: at(1190),
      observedAt: at(1300),
    });
    expect(facts(left, earlier).departureAt).toBe(at(1205));
    expect(facts(left, earlier, approvalOf(earlier)).departureAt).toBe(at(1190));
    const between = { ...corrected, observedAt: at(1200) };
    expect(checkedAt(tick, left, between)).toBe(at(240));
    expect(checkedAt(tick, left, between, earlier, approvalOf(earlier))).toBe(at(300));
  });
});

describe('a withdrawal', () => {
  it('after the departure waits until another person approves it', () => {
    expect(checkedAt(tick, left, takenBack)).toBe(at(300));
    expect(checkedAt(tick, left, takenBack, approvalOf(takenBack))).toBeUndefined();
  });

  it('within ten seconds by the same hand is an undo and needs nobody', () => {
    const late = aStepDone('cab-brake-check', 1250);
    const undo = anEntry('withdrawn', { target: late.id, reason: 'undo', observedAt: at(1260) });
    expect(checkedAt(left, late, undo)).toBeUndefined();
    expect(checkedAt(left, late, { ...undo, by: other })).toBe(at(1250));
    expect(checkedAt(left, late, { ...undo, observedAt: at(1266) })).toBe(at(1250));
  });

  it('is an undo of what was entered later when it follows the entering', () => {
    const late = aStepDone('cab-brake-check', 300, { source: 'entered-later', receivedAt: at(1400) });
    const undo = anEntry('withdrawn', { target: late.id, reason: 'undo', observedAt: at(1408) });
    expect(checkedAt(left, late, undo)).toBeUndefined();
  });

  it('of the departure needs nobody: the train has not left', () => {
    const found = facts(tick, left, anEntry('withdrawn', { target: left.id, observedAt: at(1300) }));
    expect(found.departureAt).toBeNull();
    expect(found.corrections).toEqual([]);
  });

  it('of the departure lets what waited for it take effect', () => {
    const stays = anEntry('withdrawn', { target: left.id, observedAt: at(1400) });
    expect(checkedAt(tick, left, corrected, stays)).toBe(at(240));
  });

  it('of a decision changes nothing, unless it is an undo', () => {
    const yes = approvalOf(corrected);
    const later = anEntry('withdrawn', { target: yes.id, by: supervisor, observedAt: at(1700) });
    expect(checkedAt(tick, left, corrected, yes, later)).toBe(at(240));
    const undo = { ...later, observedAt: at(1506) };
    expect(checkedAt(tick, left, corrected, yes, undo)).toBe(at(300));
  });
});

it('asks whether one more change would wait', () => {
  if (corrected.kind !== 'corrected') throw new Error('a correction is one');
  expect(wouldNeedApproval([tick], corrected)).toBe(false);
  expect(wouldNeedApproval([tick, left], corrected)).toBe(true);
});
