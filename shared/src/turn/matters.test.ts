import { describe, expect, it } from 'vitest';
import { turnMattersOf } from '../contract/wire-turn-matters';
import { addSeconds, formatInstant } from '../lib/instant';
import { defaultStepPlanSteps } from '../plan/default-step-plan';
import { aStepDone, aTurn, anEntry, fixedArrival } from '../testing/builders';
import { attendanceAt } from './attendance';
import type { Entry } from './entry';
import { turnFrom } from './evolve';
import type { TurnFacts } from './facts';
import { formatEntryFinding } from './finding-words';

const at = (seconds: number): number => addSeconds(fixedArrival, seconds);
const iso = (seconds: number): string => formatInstant(at(seconds));
const turnWith = (...entries: Entry[]): TurnFacts => turnFrom(aTurn(), defaultStepPlanSteps, entries);
const codes = (facts: TurnFacts): string[] => facts.findings.map((finding) => finding.code);
const words = (facts: TurnFacts): string[] =>
  facts.findings.map((finding) =>
    formatEntryFinding(finding, facts.steps, (when) => iso((when - at(0)) / 1000)),
  );

const desk = { personId: 'p-desk', name: 'R. Hallam' };
const conductor = { personId: 'p-conductor', name: 'M. Tolland' };
const goes = { personId: 'p-goes', name: 'P. Varga' };
const comes = { personId: 'p-comes', name: 'L. Stroud' };

const byHand = aStepDone('cab-brake-check', 300, { by: conductor });
const byRadio = aStepDone('cab-brake-check', 420, { source: 'by-radio', by: desk, saidBy: 'Varga' });

describe('a ruling', () => {
  const ruling = anEntry('ruled', {
    target: byRadio.id,
    considered: [byHand.id, byRadio.id],
    by: desk,
    observedAt: at(600),
  });

  it('makes its account count, whatever the rank, and ends the question', () => {
    expect(turnWith(byHand, byRadio).inQuestion.map(({ step }) => step)).toEqual(['cab-brake-check']);
    const facts = turnWith(byHand, byRadio, ruling);
    expect(facts.doneAt['cab-brake-check']).toBe(at(420));
    expect(facts.inQuestion).toEqual([]);
  });

  it('stands until an account that it did not consider lies more than 60 s away', () => {
    const near = aStepDone('cab-brake-check', 480, { source: 'entered-later' });
    expect(turnWith(byHand, byRadio, ruling, near).inQuestion).toEqual([]);
    const far = aStepDone('cab-brake-check', 481, { source: 'entered-later' });
    const facts = turnWith(byHand, byRadio, ruling, far);
    expect(facts.inQuestion.map(({ step }) => step)).toEqual(['cab-brake-check']);
    expect(facts.doneAt['cab-brake-check']).toBe(at(420));
  });

  it('is replaced by a later one, and void when its account was taken back', () => {
    const later = anEntry('ruled', { target: byHand.id, considered: [byRadio.id], observedAt: at(700) });
    expect(turnWith(byHand, byRadio, ruling, later).doneAt['cab-brake-check']).toBe(at(300));
    const back = anEntry('withdrawn', { target: byRadio.id, observedAt: at(650) });
    expect(turnWith(byHand, byRadio, ruling, back).doneAt['cab-brake-check']).toBe(at(300));
  });

  it('settles an arrival and a departure as well', () => {
    const feed = anEntry('departure', { source: 'by-feed', by: null, observedAt: at(1205) });
    const seen = anEntry('departure', { source: 'by-radio', observedAt: at(1300) });
    const ruled = anEntry('ruled', { target: seen.id, considered: [feed.id], observedAt: at(1400) });
    expect(turnWith(feed, seen, ruled)).toMatchObject({ departureAt: at(1300), inQuestion: [] });
  });

  it('decides which count of handbrakes is the one that was set', () => {
    const two = aStepDone('handbrake-set', 60, { reading: { count: 2 } });
    const three = aStepDone('handbrake-set', 200, { source: 'by-radio', reading: { count: 3 } });
    const ruled = anEntry('ruled', { target: three.id, considered: [two.id], observedAt: at(300) });
    expect(turnWith(two, three).handbrakes.set).toBe(2);
    expect(turnWith(two, three, ruled).handbrakes.set).toBe(3);
  });
});

describe('an answer to a step by radio', () => {
  const disagrees = anEntry('disagreed', {
    target: byRadio.id,
    reason: 'not tested',
    by: conductor,
    observedAt: at(500),
  });

  it('is asked for until the crew agrees', () => {
    expect(turnWith(byRadio).asksAgreement).toMatchObject([{ step: 'cab-brake-check' }]);
    const agrees = anEntry('agreed', { target: byRadio.id, by: conductor });
    expect(turnWith(byRadio, agrees).asksAgreement).toEqual([]);
    expect(turnWith(byRadio, agrees).inQuestion).toEqual([]);
  });

  it('is not asked for where the crew told of the step by hand', () => {
    expect(turnWith(byRadio, byHand).asksAgreement).toEqual([]);
  });

  it('of no puts the step in question, in words, until a person rules', () => {
    const facts = turnWith(byRadio, disagrees);
    expect(turnMattersOf(facts).inQuestion).toEqual([
      {
        step: 'cab-brake-check',
        accounts: [
          { entryId: byRadio.id, at: iso(420), source: 'by-radio', by: 'R. Hallam', saidBy: 'Varga' },
        ],
        objections: [
          { entryId: disagrees.id, target: byRadio.id, at: iso(500), by: 'M. Tolland', reason: 'not tested' },
        ],
      },
    ]);
    expect(words(facts)).toContain(
      `Cab brake check ${iso(420)} by radio (Varga): M. Tolland does not agree: not tested. Which one?`,
    );
    const ruled = anEntry('ruled', { target: byRadio.id, considered: [], observedAt: at(600) });
    expect(turnWith(byRadio, disagrees, ruled).inQuestion).toEqual([]);
  });

  it('of no that turned into a yes ends the question', () => {
    const agrees = anEntry('agreed', { target: byRadio.id, by: conductor, observedAt: at(550) });
    expect(turnWith(byRadio, disagrees, agrees).inQuestion).toEqual([]);
  });

  it('to an own entry says nothing', () => {
    expect(turnWith(byRadio, { ...disagrees, by: desk }).inQuestion).toEqual([]);
  });
});

describe('a relief', () => {
  const relief = (by: typeof goes, faceToFace = true): Entry =>
    anEntry('relief', { out: goes, in: comes, as: 'engineer', faceToFace, by, observedAt: at(400) });
  const typeOf = (...entries: Entry[]) => {
    const [first] = turnWith(...entries).reliefs;
    return { faceToFace: first?.faceToFace, awaits: first?.awaits };
  };

  it('written by somebody who is neither is as the entry says', () => {
    expect(typeOf(relief(desk))).toEqual({ faceToFace: true, awaits: null });
    expect(typeOf(relief(desk, false))).toEqual({ faceToFace: false, awaits: null });
  });

  it('written by one of the two waits for the word of the other', () => {
    expect(typeOf(relief(goes))).toEqual({ faceToFace: false, awaits: 'p-comes' });
    expect(typeOf(relief(comes))).toEqual({ faceToFace: false, awaits: 'p-goes' });
  });

  it('is face to face when the other agrees, or wrote the same', () => {
    const first = relief(goes);
    const agrees = anEntry('agreed', { target: first.id, by: comes, observedAt: at(420) });
    expect(typeOf(first, agrees)).toEqual({ faceToFace: true, awaits: null });
    expect(typeOf(first, relief(comes))).toEqual({ faceToFace: true, awaits: null });
    expect(typeOf(first, { ...agrees, by: conductor })).toEqual({ faceToFace: false, awaits: 'p-comes' });
  });

  it('is not when the other does not agree', () => {
    const first = relief(goes);
    const objects = anEntry('disagreed', { target: first.id, by: comes, observedAt: at(420) });
    expect(typeOf(first, objects)).toEqual({ faceToFace: false, awaits: null });
  });

  it('of the engineer that is not face to face names the test and its source', () => {
    expect(words(turnWith(relief(desk, false)))[0]).toBe(
      `P. Varga relieved by L. Stroud at ${iso(400)}, not face to face. An operator who first takes charge other than face to face: Class II brake test (49 CFR 238.317(a)(5), editions 2004 and 2005).`,
    );
    expect(words(turnWith(relief(goes)))[0]).toContain('L. Stroud has not said so');
    expect(codes(turnWith(relief(desk)))).toEqual([]);
    const ofConductor = anEntry('relief', { out: goes, in: comes, as: 'conductor', by: desk });
    expect(codes(turnWith(ofConductor))).toEqual([]);
  });

  it('that both wrote down is told once', () => {
    expect(turnMattersOf(turnWith(relief(goes), relief(comes))).reliefs).toHaveLength(1);
  });
});

describe('a tie-up', () => {
  const arrival = anEntry('arrival', { observedAt: at(0) });
  const tiedUp = anEntry('tied-up', { observedAt: at(500), handbrakes: { count: 2, cars: ['1', '2'] } });

  it('leaves the set unattended, and secured by the handbrakes it names', () => {
    const facts = turnWith(arrival, tiedUp);
    expect(attendanceAt(facts, at(550))).toEqual({ unattendedSince: at(500), unsecuredSince: null });
    const none = anEntry('tied-up', { observedAt: at(500), handbrakes: { count: 0, cars: [] } });
    expect(attendanceAt(turnWith(arrival, none), at(550)).unsecuredSince).toBe(at(500));
  });

  it('with an open step of securement is a finding that carries the reason', () => {
    const reasoned = anEntry('tied-up', { observedAt: at(500), reason: 'chocked on both sides' });
    expect(words(turnWith(arrival, reasoned))).toContain(
      `Tied up at ${iso(500)}, handbrake set not recorded. Reason: chocked on both sides.`,
    );
    const done = aStepDone('handbrake-set', 100, { reading: { count: 2 } });
    expect(codes(turnWith(arrival, done, tiedUp))).toEqual([]);
  });
});

describe('the matters of a turn', () => {
  it('are nothing at all on a quiet turn', () => {
    expect(turnMattersOf(turnWith(byHand))).toEqual({});
  });

  it('tell who had the briefing, and what is wrong with which car', () => {
    const briefing = anEntry('briefing', { by: conductor });
    const defect = anEntry('defect', { car: '1412', cause: 'door', by: conductor, observedAt: at(90) });
    expect(turnMattersOf(turnWith(briefing, defect))).toEqual({
      briefedBy: ['p-conductor'],
      defects: [{ entryId: defect.id, at: iso(90), by: 'M. Tolland', car: '1412', cause: 'door' }],
    });
  });
});
