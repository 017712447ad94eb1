import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { addSeconds } from '../lib/instant';
import { defaultStepPlanSteps } from '../plan/default-step-plan';
import { aTurn, fixedArrival } from '../testing/builders';
import {
  CREW_ROLES,
  DEFECT_CAUSES,
  ENTRY_KINDS,
  ENTRY_SOURCES,
  TIE_UP_CHECKS,
  type Entry,
  type EntryAuthor,
  type EntryContent,
} from './entry';
import { evolve, startOfTurn, turnFrom } from './evolve';
import { formatEntryFinding } from './finding-words';
import { lifeOf } from './life';
import { TURN_STATES } from './turn';

/* Few ids, few times and few people, so that targets are met, ties happen and one id comes with two bodies. */
const ids = fc.constantFrom('a', 'b', 'c', 'd', 'e', 'f', 'g');
const times = fc.integer({ min: -10, max: 40 }).map((half) => addSeconds(fixedArrival, half * 30));
const people: fc.Arbitrary<EntryAuthor> = fc.constantFrom(
  { personId: 'p', name: 'P' },
  { personId: 'q', name: 'Q' },
);
const roles = fc.constantFrom(...CREW_ROLES);
const words = fc.string({ maxLength: 6 });
const steps = fc.constantFrom(...defaultStepPlanSteps.map((step) => step.key), 'lunch', 'constructor');
const maybe = <Value>(value: fc.Arbitrary<Value>): fc.Arbitrary<Value | undefined> =>
  fc.option(value, { nil: undefined });
const readings = fc.record({
  count: maybe(fc.integer({ min: 0, max: 3 })),
  cars: maybe(fc.array(fc.constantFrom('1', '2', '3'), { maxLength: 3 })),
});

const contents: { [Kind in EntryContent['kind']]: fc.Arbitrary<EntryContent> } = {
  arrival: fc.constant({ kind: 'arrival' }),
  departure: fc.constant({ kind: 'departure' }),
  'expected-arrival': fc.record({ kind: fc.constant('expected-arrival'), expectedAt: times }),
  'step-done': fc.record({ kind: fc.constant('step-done'), step: steps, reading: maybe(readings) }),
  withdrawn: fc.record({ kind: fc.constant('withdrawn'), target: ids, reason: words }),
  corrected: fc.record({
    kind: fc.constant('corrected'),
    target: ids,
    correctedObservedAt: maybe(times),
    reading: maybe(readings),
    reason: words,
  }),
  'cannot-do': fc.record({ kind: fc.constant('cannot-do'), step: steps, reason: words }),
  crew: fc.record({ kind: fc.constant('crew'), person: people, as: roles }),
  relief: fc.record({
    kind: fc.constant('relief'),
    out: people,
    in: fc.option(people, { nil: null }),
    as: roles,
    faceToFace: fc.boolean(),
  }),
  briefing: fc.constant({ kind: 'briefing' }),
  track: fc.record({ kind: fc.constant('track'), track: words }),
  set: fc.record({ kind: fc.constant('set'), set: words }),
  hold: fc.record({ kind: fc.constant('hold'), until: times, reason: words }),
  annulled: fc.record({ kind: fc.constant('annulled'), reason: words }),
  'blue-signal-up': fc.constant({ kind: 'blue-signal-up' }),
  'blue-signal-down': fc.constant({ kind: 'blue-signal-down' }),
  note: fc.record({ kind: fc.constant('note'), note: words }),
  agreed: fc.record({ kind: fc.constant('agreed'), target: ids }),
  disagreed: fc.record({ kind: fc.constant('disagreed'), target: ids, reason: words }),
  ruled: fc.record({ kind: fc.constant('ruled'), target: ids, considered: fc.array(ids, { maxLength: 3 }) }),
  'correction-approved': fc.record({ kind: fc.constant('correction-approved'), target: ids }),
  'correction-declined': fc.record({ kind: fc.constant('correction-declined'), target: ids, reason: words }),
  defect: fc.record({
    kind: fc.constant('defect'),
    car: fc.option(fc.constantFrom('1', '2'), { nil: null }),
    cause: fc.constantFrom(...DEFECT_CAUSES),
    note: maybe(words),
  }),
  'tied-up': fc.record({
    kind: fc.constant('tied-up'),
    handbrakes: fc.record({
      count: fc.integer({ min: 0, max: 3 }),
      cars: fc.array(fc.constantFrom('1', '2', '3'), { maxLength: 3 }),
    }),
    checks: fc.subarray([...TIE_UP_CHECKS]),
    offAir: maybe(fc.boolean()),
    reason: maybe(words),
  }),
};

const entryFacts = fc.record({
  id: ids,
  subject: fc.constant({ kind: 'turn' as const, id: 'turn-1' }),
  observedAt: times,
  receivedAt: times,
  source: fc.constantFrom(...ENTRY_SOURCES),
  by: fc.option(people),
  saidBy: maybe(words),
});

function entriesOf(...kinds: EntryContent['kind'][]): fc.Arbitrary<Entry> {
  return fc
    .tuple(entryFacts, fc.oneof(...kinds.map((kind) => contents[kind])))
    .map(([facts, content]) => ({ ...facts, ...content }));
}

const entries = entriesOf(...ENTRY_KINDS);

const logs = fc.array(entries, { maxLength: 12 });

/* Logs in which the parts of a correction meet: a departure, what was recorded before it, requests and decisions. */
const disputed = fc
  .tuple(
    fc.array(entriesOf('departure', 'step-done', 'ruled'), { minLength: 2, maxLength: 5 }),
    fc.array(entriesOf('corrected', 'withdrawn'), { minLength: 1, maxLength: 4 }),
    fc.array(entriesOf('correction-approved', 'correction-declined', 'agreed', 'disagreed'), {
      maxLength: 4,
    }),
  )
  .map((parts) => parts.flat());
const someLog = fc.oneof(logs, disputed);
const runs = { seed: 41, numRuns: 800 };

describe('the facts of a turn', () => {
  it('are the same for every order in which the entries arrive, also when some arrive twice', () => {
    const shuffled = someLog.chain((log) =>
      fc.tuple(fc.constant(log), fc.shuffledSubarray(log, { minLength: log.length }), fc.subarray(log)),
    );
    fc.assert(
      fc.property(shuffled, ([log, otherOrder, again]) => {
        const first = turnFrom(aTurn(), defaultStepPlanSteps, log);
        const start = startOfTurn(aTurn(), defaultStepPlanSteps);
        expect([...otherOrder, ...again].reduce(evolve, start)).toEqual(first);
      }),
      runs,
    );
  });

  it('come out of any entries without an exception, with a state and with findings in words', () => {
    fc.assert(
      fc.property(someLog, times, fc.constantFrom('turn', 'first-out', 'tie-up'), (log, now, kind) => {
        const facts = turnFrom(aTurn({ kind }), defaultStepPlanSteps, log);
        expect(TURN_STATES).toContain(lifeOf(facts, now));
        for (const finding of facts.findings) {
          const said = formatEntryFinding(finding, facts.steps, () => '17:20:00');
          expect(said).toMatch(/[.?]$/);
          expect(said).not.toMatch(/undefined|null|NaN/);
        }
      }),
      runs,
    );
  });

  it('never lose an entry: every id that came in is kept', () => {
    fc.assert(
      fc.property(logs, (log) => {
        const facts = turnFrom(aTurn(), defaultStepPlanSteps, log);
        expect(new Set(facts.entries.map(({ id }) => id))).toEqual(new Set(log.map(({ id }) => id)));
      }),
      runs,
    );
  });

  it('change by a request after the departure only when another person approved it', () => {
    fc.assert(
      fc.property(disputed, (log) => {
        const facts = turnFrom(aTurn(), defaultStepPlanSteps, log);
        for (const correction of facts.corrections) {
          const decidedBy = correction.decision?.by?.personId;
          if (correction.state === 'approved') expect(decidedBy).not.toBe(correction.by?.personId ?? null);
          if (correction.state === 'approved') continue;
          const without = facts.entries.filter((entry) => entry.id !== correction.entryId);
          const same = turnFrom(aTurn(), defaultStepPlanSteps, without);
          expect([same.doneAt, same.departureAt]).toEqual([facts.doneAt, facts.departureAt]);
        }
      }),
      runs,
    );
  });
});
