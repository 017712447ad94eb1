import { describe, expect, it } from 'vitest';
import { addSeconds } from '../lib/instant';
import { defaultStepPlanSteps } from '../plan/default-step-plan';
import { aStepDone, aTurn, anEntry, fixedArrival, fixedDeparture } from '../testing/builders';
import type { Entry } from './entry';
import { evolve, startOfTurn, turnFrom } from './evolve';
import type { TurnFacts } from './facts';

const at = (seconds: number): number => addSeconds(fixedArrival, seconds);
const turnWith = (...entries: Entry[]): TurnFacts => turnFrom(aTurn(), defaultStepPlanSteps, entries);
const codes = (facts: TurnFacts): string[] => facts.findings.map((finding) => finding.code);

describe('a turn of which nothing has been heard', () => {
  it('is as it was planned', () => {
    const facts = startOfTurn(aTurn(), defaultStepPlanSteps);
    expect(facts).toMatchObject({
      arrivalAt: null,
      departureAt: null,
      expectedArrivalAt: null,
      heldUntil: null,
      track: '3',
      set: '41',
      crew: [],
      doneAt: {},
      blueSignal: null,
      annulled: null,
      lastHeardAt: null,
      findings: [],
    });
  });

  it('becomes the same one entry at a time as all at once', () => {
    const entries = [anEntry('arrival'), aStepDone('handbrake-set', 70), anEntry('note')];
    const start = startOfTurn(aTurn(), defaultStepPlanSteps);
    expect(entries.reduce(evolve, start)).toEqual(turnWith(...entries));
  });
});

describe('an entry', () => {
  it('that comes twice with the same id is one entry', () => {
    const tick = aStepDone('handbrake-set', 70);
    expect(turnWith(tick, tick, { ...tick }).entries).toHaveLength(1);
  });

  it('about a step is kept with who, how and what was read', () => {
    const tick = aStepDone('handbrake-set', 70, {
      source: 'by-radio',
      saidBy: 'Tolland',
      reading: { count: 2 },
    });
    expect(turnWith(tick).done['handbrake-set']).toEqual({
      entryId: tick.id,
      at: at(70),
      source: 'by-radio',
      by: { personId: 'p-conductor', name: 'M. Tolland' },
      saidBy: 'Tolland',
      reading: { count: 2 },
      corrected: false,
    });
  });

  it('about a step that this turn does not have is kept and becomes a finding', () => {
    const facts = turnWith(aStepDone('lunch', 70));
    expect(facts.entries).toHaveLength(1);
    expect(facts.doneAt).toEqual({});
    expect(codes(facts)).toEqual(['entry.unknown_step']);
  });

  it('says when the turn was last heard of by its receipt, not by the time it claims', () => {
    const late = anEntry('note', { observedAt: at(10), receivedAt: at(900) });
    const claimsTomorrow = anEntry('note', { observedAt: at(86_400), receivedAt: at(20) });
    expect(turnWith(late, claimsTomorrow).lastHeardAt).toBe(at(900));
  });

  it('that claims a time more than a minute after its receipt is kept and its clock doubted', () => {
    expect(codes(turnWith(anEntry('note', { observedAt: at(60), receivedAt: at(0) })))).toEqual([]);
    expect(codes(turnWith(anEntry('note', { observedAt: at(61), receivedAt: at(0) })))).toEqual([
      'entry.in_future',
    ]);
  });
});

describe('two accounts of one thing', () => {
  it.each([
    ['by-hand', 'by-feed'],
    ['by-feed', 'by-radio'],
    ['by-radio', 'entered-later'],
  ] as const)('count by rank: %s before %s, although it is later', (better, worse) => {
    const facts = turnWith(
      anEntry('arrival', { source: worse, observedAt: at(0) }),
      anEntry('arrival', { source: better, observedAt: at(30) }),
    );
    expect(facts.arrivalAt).toBe(at(30));
  });

  it('of the same rank count by the earlier time', () => {
    expect(
      turnWith(aStepDone('handbrake-set', 90), aStepDone('handbrake-set', 80)).doneAt['handbrake-set'],
    ).toBe(at(80));
  });

  it('of the same rank and time count by the smaller id', () => {
    const facts = turnWith(
      aStepDone('cab-brake-check', 90, { id: 'b' }),
      aStepDone('cab-brake-check', 90, { id: 'a' }),
    );
    expect(facts.done['cab-brake-check']?.entryId).toBe('a');
  });

  it('are in question when more than 60 s apart, and not at exactly 60', () => {
    const first = aStepDone('cab-brake-check', 100);
    expect(turnWith(first, aStepDone('cab-brake-check', 160, { source: 'by-radio' })).inQuestion).toEqual([]);
    const facts = turnWith(first, aStepDone('cab-brake-check', 161, { source: 'by-radio' }));
    expect(
      facts.inQuestion.map(({ step, accounts }) => [step, accounts.map((account) => account.at)]),
    ).toEqual([['cab-brake-check', [at(100), at(161)]]]);
    expect(facts.doneAt['cab-brake-check']).toBe(at(100));
  });

  it('of the arrival or the departure may be in question too', () => {
    const facts = turnWith(
      anEntry('arrival', { observedAt: at(0), source: 'by-feed' }),
      anEntry('arrival', { observedAt: at(120), source: 'by-radio' }),
    );
    expect(facts.inQuestion.map(({ step }) => step)).toEqual(['arrival']);
  });

  it('are out of question when a person takes one of them back', () => {
    const wrong = aStepDone('cab-brake-check', 400, { source: 'by-radio' });
    const facts = turnWith(
      aStepDone('cab-brake-check', 100),
      wrong,
      anEntry('withdrawn', { target: wrong.id }),
    );
    expect(facts.inQuestion).toEqual([]);
  });
});

describe('what is said anew', () => {
  it('counts as last observed, not as last received: track, set, expected arrival, hold', () => {
    const facts = turnWith(
      anEntry('track', { track: '5', observedAt: at(20), receivedAt: at(21) }),
      anEntry('track', { track: '4', observedAt: at(10), receivedAt: at(99) }),
      anEntry('set', { set: '43', observedAt: at(20) }),
      anEntry('set', { set: '42', observedAt: at(10) }),
      anEntry('expected-arrival', { expectedAt: at(300), observedAt: at(-60) }),
      anEntry('expected-arrival', { expectedAt: at(200), observedAt: at(-30) }),
      anEntry('hold', { until: at(1500), reason: 'first', observedAt: at(30) }),
      anEntry('hold', { until: at(1300), reason: 'second', observedAt: at(40) }),
    );
    expect(facts).toMatchObject({
      track: '5',
      set: '43',
      expectedArrivalAt: at(200),
      heldUntil: at(1300),
      holdReason: 'second',
    });
  });

  it('of two at the same time counts by the smaller id', () => {
    const facts = turnWith(
      anEntry('track', { id: 'b', track: '5' }),
      anEntry('track', { id: 'a', track: '4' }),
    );
    expect(facts.track).toBe('4');
  });
});

describe('a withdrawal', () => {
  const tick = aStepDone('handbrake-set', 70);
  const undo = anEntry('withdrawn', { target: tick.id, observedAt: at(75) });

  it('takes a step back, keeps both entries, and says that it was withdrawn', () => {
    const facts = turnWith(tick, undo);
    expect(facts.doneAt).toEqual({});
    expect(facts.withdrawn).toEqual(['handbrake-set']);
    expect(facts.entries).toHaveLength(2);
  });

  it('that came before its target still takes it back', () => {
    expect(turnWith(undo, tick)).toEqual(turnWith(tick, undo));
  });

  it('is over when the step is recorded again', () => {
    const facts = turnWith(tick, undo, aStepDone('handbrake-set', 90));
    expect(facts.withdrawn).toEqual([]);
    expect(facts.doneAt['handbrake-set']).toBe(at(90));
  });

  it('may itself be withdrawn; then its target stands again', () => {
    expect(turnWith(tick, undo, anEntry('withdrawn', { target: undo.id })).doneAt['handbrake-set']).toBe(
      at(70),
    );
  });

  it('takes back an annulment, a hold and a blue signal as well', () => {
    const annulled = anEntry('annulled');
    const hold = anEntry('hold');
    const signal = anEntry('blue-signal-up');
    const all = [annulled, hold, signal].map((entry) => anEntry('withdrawn', { target: entry.id }));
    expect(turnWith(annulled, hold, signal, ...all)).toMatchObject({
      annulled: null,
      heldUntil: null,
      blueSignal: null,
    });
  });

  it('of an entry that is not on this turn changes nothing and becomes a finding', () => {
    expect(codes(turnWith(anEntry('withdrawn', { target: 'elsewhere' })))).toEqual(['entry.unknown_target']);
  });
});

describe('a correction', () => {
  const tick = aStepDone('cab-brake-check', 300, { reading: { brakePipePsi: 65 } });

  it('changes time and reading and leaves the first entry as it was written', () => {
    const facts = turnWith(
      tick,
      anEntry('corrected', { target: tick.id, correctedObservedAt: at(240), reading: { brakePipePsi: 70 } }),
    );
    expect(facts.done['cab-brake-check']).toMatchObject({
      at: at(240),
      reading: { brakePipePsi: 70 },
      corrected: true,
    });
    expect(facts.entries.find((entry) => entry.id === tick.id)).toEqual(tick);
  });

  it('of the time leaves the reading, and the other way round', () => {
    const time = anEntry('corrected', { target: tick.id, correctedObservedAt: at(240), observedAt: at(400) });
    const reading = anEntry('corrected', {
      target: tick.id,
      reading: { brakePipePsi: 70 },
      observedAt: at(500),
    });
    expect(turnWith(tick, time, reading).done['cab-brake-check']).toMatchObject({
      at: at(240),
      reading: { brakePipePsi: 70 },
    });
  });

  it('that is observed later counts, and one of a correction corrects the entry itself', () => {
    const first = anEntry('corrected', {
      target: tick.id,
      correctedObservedAt: at(240),
      observedAt: at(400),
    });
    const second = anEntry('corrected', {
      target: first.id,
      correctedObservedAt: at(250),
      observedAt: at(500),
    });
    expect(turnWith(second, tick, first).doneAt['cab-brake-check']).toBe(at(250));
  });

  it('that is withdrawn no longer counts', () => {
    const wrong = anEntry('corrected', { target: tick.id, correctedObservedAt: at(240) });
    expect(turnWith(tick, wrong, anEntry('withdrawn', { target: wrong.id })).doneAt['cab-brake-check']).toBe(
      at(300),
    );
  });
});

describe('handbrakes', () => {
  const setTwo = aStepDone('handbrake-set', 70, { reading: { count: 2, cars: ['1408', '1412'] } });
  const release = (
    seconds: number,
    reading?: { count?: number; cars?: string[] },
    source: Entry['source'] = 'by-hand',
  ) => aStepDone('handbrake-released', seconds, { reading, source });

  it('released in full are a step done', () => {
    const facts = turnWith(setTwo, release(960, { count: 2 }));
    expect(facts.doneAt['handbrake-released']).toBe(at(960));
    expect(facts.handbrakes).toMatchObject({ set: 2, released: 2 });
  });

  it('released in part keep the step open and say which car is left', () => {
    const facts = turnWith(setTwo, release(960, { count: 1, cars: ['1408'] }));
    expect(facts.doneAt['handbrake-released']).toBeUndefined();
    expect(facts.findings).toContainEqual({
      code: 'entry.smaller_count',
      step: 'handbrake-released',
      released: 1,
      set: 2,
      cars: ['1412'],
    });
  });

  it('released one after the other are done with the last', () => {
    const facts = turnWith(
      setTwo,
      release(960, { count: 1, cars: ['1408'] }),
      release(980, { count: 1, cars: ['1412'] }),
    );
    expect(facts.doneAt['handbrake-released']).toBe(at(980));
    expect(facts.inQuestion).toEqual([]);
  });

  it('released in part, then told as a whole, are done with the second entry', () => {
    const facts = turnWith(setTwo, release(960, { count: 1 }), release(1100, { count: 2 }));
    expect(facts.doneAt['handbrake-released']).toBe(at(1100));
    expect(facts.inQuestion).toEqual([]);
    expect(codes(facts)).not.toContain('entry.larger_count');
  });

  it('of the same car told twice are one handbrake', () => {
    const facts = turnWith(setTwo, release(960, { cars: ['1408'] }), release(980, { cars: ['1408'] }));
    expect(facts.doneAt['handbrake-released']).toBeUndefined();
    expect(facts.handbrakes).toMatchObject({ released: 1, carsStillSet: ['1412'] });
  });

  it('told by two people are not added up', () => {
    const facts = turnWith(setTwo, release(960, { count: 1 }), release(965, { count: 1 }, 'by-radio'));
    expect(facts.doneAt['handbrake-released']).toBeUndefined();
    expect(facts.handbrakes.released).toBe(1);
  });

  it('released without a count are all released, and the missing count is a finding', () => {
    const facts = turnWith(setTwo, release(960));
    expect(facts.doneAt['handbrake-released']).toBe(at(960));
    expect(codes(facts)).toContain('entry.no_count');
  });

  it('set without a count are released by any count', () => {
    const facts = turnWith(aStepDone('handbrake-set', 70), release(960, { count: 1 }));
    expect(facts.doneAt['handbrake-released']).toBe(at(960));
    expect(facts.handbrakes.set).toBeNull();
  });

  it('are not released by a record that says that none was', () => {
    expect(
      turnWith(aStepDone('handbrake-set', 70), release(960, { count: 0 })).doneAt['handbrake-released'],
    ).toBeUndefined();
    expect(turnWith(setTwo, release(960, { count: 0 })).doneAt['handbrake-released']).toBeUndefined();
  });

  it('released in greater number than set are done, and a finding', () => {
    const facts = turnWith(setTwo, release(960, { count: 3 }));
    expect(facts.doneAt['handbrake-released']).toBe(at(960));
    expect(codes(facts)).toContain('entry.larger_count');
  });

  it('of which none was set do not secure the train', () => {
    const facts = turnWith(aStepDone('handbrake-set', 70, { reading: { count: 0 } }));
    expect(facts.doneAt['handbrake-set']).toBeUndefined();
    expect(codes(facts)).toContain('entry.no_handbrake');
  });

  it('with a corrected count are judged by the correction', () => {
    const half = release(960, { count: 1 });
    const facts = turnWith(setTwo, half, anEntry('corrected', { target: half.id, reading: { count: 2 } }));
    expect(facts.doneAt['handbrake-released']).toBe(at(960));
  });

  it('are logged as they stand after each change', () => {
    const facts = turnWith(setTwo, release(960, { count: 1 }), release(980, { count: 1 }));
    expect(facts.handbrakes.log).toEqual([
      { at: at(70), standing: 2 },
      { at: at(960), standing: 1 },
      { at: at(980), standing: 0 },
    ]);
  });
});

describe('a step that cannot be done', () => {
  const cannot = anEntry('cannot-do', { step: 'cab-brake-check', reason: 'no air', observedAt: at(200) });

  it('says why and who said so', () => {
    expect(turnWith(cannot).cannotDo).toEqual([
      { step: 'cab-brake-check', entryId: cannot.id, at: at(200), reason: 'no air', by: 'M. Tolland' },
    ]);
  });

  it('is forgotten when it is done after all', () => {
    expect(turnWith(cannot, aStepDone('cab-brake-check', 400)).cannotDo).toEqual([]);
  });
});

describe('blue signals', () => {
  const inspector = { personId: 'p-1', name: 'E. Abara' };
  const other = { personId: 'p-2', name: 'J. Quist' };

  it('stand until they are taken down', () => {
    const up = anEntry('blue-signal-up', { by: inspector, observedAt: at(100) });
    expect(turnWith(up).blueSignal).toEqual({ since: at(100), by: 'E. Abara' });
    expect(
      turnWith(up, anEntry('blue-signal-down', { by: inspector, observedAt: at(300) })).blueSignal,
    ).toBeNull();
  });

  it('of two people protect until both are down', () => {
    const facts = turnWith(
      anEntry('blue-signal-up', { by: inspector, observedAt: at(100) }),
      anEntry('blue-signal-up', { by: other, observedAt: at(150) }),
      anEntry('blue-signal-down', { by: inspector, observedAt: at(300) }),
    );
    expect(facts.blueSignal).toEqual({ since: at(150), by: 'J. Quist' });
  });

  it('put up and taken down at the same time stand: the safer reading', () => {
    const facts = turnWith(
      anEntry('blue-signal-down', { by: inspector, observedAt: at(100) }),
      anEntry('blue-signal-up', { by: inspector, observedAt: at(100) }),
    );
    expect(facts.blueSignal).not.toBeNull();
  });
});

describe('the crew', () => {
  const conductor = { personId: 'c-1', name: 'M. Tolland' };
  const engineer = { personId: 'e-1', name: 'P. Varga' };
  const carried = [{ as: 'engineer', ...engineer, since: null, carriedOver: true }] as const;

  it('is who said so last, for each job', () => {
    const facts = turnWith(
      anEntry('crew', { person: conductor, as: 'conductor', observedAt: at(-600) }),
      anEntry('crew', { person: engineer, as: 'engineer', observedAt: at(-500) }),
      anEntry('crew', { person: { personId: 'c-2', name: 'R. Sato' }, as: 'conductor', observedAt: at(100) }),
    );
    expect(facts.crew.map(({ as, name }) => [as, name])).toEqual([
      ['conductor', 'R. Sato'],
      ['engineer', 'P. Varga'],
    ]);
  });

  it('of two that say so at the same time is the one with the smaller id', () => {
    const facts = turnWith(
      anEntry('crew', { id: 'a', person: conductor, as: 'conductor' }),
      anEntry('crew', { id: 'b', person: { personId: 'c-2', name: 'R. Sato' }, as: 'conductor' }),
    );
    expect(facts.crew.map(({ name }) => name)).toEqual(['M. Tolland']);
  });

  it('from the turn before counts until somebody says otherwise', () => {
    const before = turnFrom(aTurn(), defaultStepPlanSteps, [], carried);
    expect(before.crew).toEqual(carried);
    const relieved = evolve(
      before,
      anEntry('relief', { as: 'engineer', out: engineer, in: null, observedAt: at(60) }),
    );
    expect(relieved.crew).toEqual([]);
    expect(relieved.reliefs).toMatchObject([{ at: at(60), takenOver: false, crewLeft: false }]);
  });

  it('taken over by a later crew entry ends a relief that nobody came in for', () => {
    const facts = turnWith(
      anEntry('relief', { as: 'engineer', out: engineer, in: null, observedAt: at(60) }),
      anEntry('crew', { person: engineer, as: 'engineer', observedAt: at(200) }),
    );
    expect(facts.reliefs.map(({ at: when, takenOver }) => [when, takenOver])).toEqual([
      [at(60), false],
      [at(200), true],
    ]);
  });
});

describe('findings about entries', () => {
  const full = [
    anEntry('arrival'),
    aStepDone('handbrake-set', 70),
    aStepDone('cab-brake-check', 130),
    aStepDone('ends-changed', 340),
    aStepDone('engineer-in-cab', 880),
    aStepDone('handbrake-released', 940),
    aStepDone('brakes-released', 1010),
    aStepDone('leaving-end-test', 1080),
    anEntry('departure', { observedAt: fixedDeparture }),
    aStepDone('running-test', 1400),
  ];

  it('are none on a turn worked by the book', () => {
    expect(codes(turnWith(...full))).toEqual([]);
  });

  it('tell a departure without a recorded brake test: it is kept and raises a finding', () => {
    const facts = turnWith(
      ...full.filter((entry) => !('step' in entry && entry.step === 'leaving-end-test')),
    );
    expect(facts.departureAt).toBe(fixedDeparture);
    expect(facts.findings).toEqual([
      { code: 'entry.step_missing', step: 'leaving-end-test', departureAt: fixedDeparture },
    ]);
  });

  it('tell a step recorded without the one before it, and no longer when that comes in late', () => {
    const without = full.filter((entry) => !('step' in entry && entry.step === 'handbrake-set'));
    expect(turnWith(...without).findings).toContainEqual({
      code: 'entry.out_of_order',
      step: 'cab-brake-check',
      at: at(130),
      before: 'handbrake-set',
      beforeAt: null,
    });
    expect(codes(turnWith(...without, aStepDone('handbrake-set', 70, { receivedAt: at(3000) })))).toEqual([]);
  });

  it('tell a step observed before the one it follows', () => {
    const facts = turnWith(
      anEntry('arrival'),
      aStepDone('handbrake-set', 140),
      aStepDone('cab-brake-check', 139),
    );
    expect(codes(facts)).toEqual(['entry.out_of_order']);
    expect(
      codes(turnWith(anEntry('arrival'), aStepDone('handbrake-set', 140), aStepDone('cab-brake-check', 140))),
    ).toEqual([]);
  });

  it('tell a step before the arrival', () => {
    expect(
      codes(turnWith(anEntry('arrival', { observedAt: at(60) }), aStepDone('handbrake-set', 59))),
    ).toEqual(['entry.before_arrival']);
  });

  it('tell a step earlier than its not-before time, and not at that very second', () => {
    const until = full.slice(0, 4);
    expect(codes(turnWith(...until, aStepDone('engineer-in-cab', 839)))).toEqual(['entry.too_early']);
    expect(codes(turnWith(...until, aStepDone('engineer-in-cab', 840)))).toEqual([]);
  });

  it('tell a step that the train should have waited for', () => {
    const late = aStepDone('leaving-end-test', 1230);
    const facts = turnWith(
      ...full.filter((entry) => !('step' in entry && entry.step === 'leaving-end-test')),
      late,
    );
    expect(codes(facts)).toEqual(['entry.after_departure']);
  });

  it('tell what was done and that it left while a blue signal was up', () => {
    const facts = turnWith(...full, anEntry('blue-signal-up', { observedAt: at(1000) }));
    expect(facts.findings.filter(({ code }) => code === 'entry.blue_signal_up')).toMatchObject([
      { step: 'brakes-released' },
      { step: 'leaving-end-test' },
      { step: 'running-test' },
      { step: 'departure' },
    ]);
  });
});
