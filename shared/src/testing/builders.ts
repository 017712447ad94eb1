import { defaultStepPlanKey, defaultStepPlanName, defaultStepPlanSteps } from '../plan/default-step-plan';
import type { PlanStep, StepPlan } from '../plan/step-plan';
import { addSeconds, type Instant } from '../lib/instant';
import type { Entry, EntryContent, EntryKind, EntrySource } from '../turn/entry';
import type { PlannedTurn } from '../turn/turn';

/** A quiet Tuesday on which nothing happens to the clocks: 2026-03-03, 17:00 in America/New_York. */
export const fixedServiceDate = '2026-03-03';
/** Zone of the fixed instants. */
export const fixedZone = 'America/New_York';
/** 22:00Z, 17:00 by the clock of the fixed zone: the scheduled arrival of `aTurn()`. */
export const fixedArrival: Instant = Date.UTC(2026, 2, 3, 22, 0, 0);
/** Twenty minutes after the arrival: the scheduled departure of `aTurn()`. */
export const fixedDeparture: Instant = addSeconds(fixedArrival, 1200);

/** A turn of 20 minutes on track 3: train 1741 in at 17:00, train 1742 out at 17:20. */
export function aTurn(overrides: Partial<PlannedTurn> = {}): PlannedTurn {
  return {
    id: 'turn-1',
    kind: 'turn',
    serviceDate: fixedServiceDate,
    reverses: true,
    inboundTrain: '1741',
    outboundTrain: '1742',
    scheduledArrivalAt: fixedArrival,
    scheduledDepartureAt: fixedDeparture,
    track: '3',
    set: '41',
    ...overrides,
  };
}

/** The default plan as version 1, or with other steps. */
export function aPlan(overrides: Partial<StepPlan> = {}): StepPlan {
  return {
    id: 'plan-1',
    key: defaultStepPlanKey,
    name: defaultStepPlanName,
    version: 1,
    effectiveFrom: '2026-01-01',
    steps: defaultStepPlanSteps,
    ...overrides,
  };
}

/** A step of 60 s (30 to 120) after the arrival that holds the departure. */
export function aStep(overrides: Partial<PlanStep> = {}): PlanStep {
  return {
    key: 'step',
    label: 'A step',
    shortLabel: 'Step',
    kind: 'movement',
    doer: 'engineer',
    place: 'cab',
    anchor: 'arrival',
    offsetSeconds: 120,
    shortSeconds: 30,
    typicalSeconds: 60,
    longSeconds: 120,
    after: ['arrival'],
    notBeforeSeconds: null,
    toleranceSeconds: 60,
    holdsDeparture: true,
    reads: [],
    ...overrides,
  };
}

type ContentOf<Kind extends EntryKind> = Extract<EntryContent, { kind: Kind }>;
type EntryOverrides<Kind extends EntryKind> = Partial<Omit<Entry, 'kind'>> & Partial<ContentOf<Kind>>;

const contents: { [Kind in EntryKind]: ContentOf<Kind> } = {
  arrival: { kind: 'arrival' },
  departure: { kind: 'departure' },
  'expected-arrival': { kind: 'expected-arrival', expectedAt: addSeconds(fixedArrival, 300) },
  'step-done': { kind: 'step-done', step: 'handbrake-set' },
  withdrawn: { kind: 'withdrawn', target: 'entry-1', reason: 'wrong step' },
  corrected: { kind: 'corrected', target: 'entry-1', reason: 'misread' },
  'cannot-do': { kind: 'cannot-do', step: 'cab-brake-check', reason: 'no air' },
  crew: { kind: 'crew', person: { personId: 'p-conductor', name: 'M. Tolland' }, as: 'conductor' },
  relief: {
    kind: 'relief',
    out: { personId: 'p-engineer', name: 'P. Varga' },
    in: null,
    as: 'engineer',
    faceToFace: false,
  },
  briefing: { kind: 'briefing' },
  track: { kind: 'track', track: '4' },
  set: { kind: 'set', set: '42' },
  hold: { kind: 'hold', until: addSeconds(fixedDeparture, 300), reason: 'connection' },
  annulled: { kind: 'annulled', reason: 'no crew' },
  'blue-signal-up': { kind: 'blue-signal-up' },
  'blue-signal-down': { kind: 'blue-signal-down' },
  note: { kind: 'note', note: 'door 2 locked' },
  agreed: { kind: 'agreed', target: 'entry-1' },
  disagreed: { kind: 'disagreed', target: 'entry-1', reason: 'not tested' },
  ruled: { kind: 'ruled', target: 'entry-1', considered: [] },
  'correction-approved': { kind: 'correction-approved', target: 'entry-1' },
  'correction-declined': {
    kind: 'correction-declined',
    target: 'entry-1',
    reason: 'the log of the yard agrees',
  },
  defect: { kind: 'defect', car: '1412', cause: 'door' },
  'tied-up': { kind: 'tied-up', handbrakes: { count: 2, cars: [] }, checks: ['lights', 'doors'] },
};

let made = 0;

/**
 * An entry by hand of a conductor, observed at the arrival of `aTurn()` and received two seconds after it was
 * observed. Ids count up within one run; give one where it matters.
 */
export function anEntry<Kind extends EntryKind>(kind: Kind, overrides: EntryOverrides<Kind> = {}): Entry {
  made += 1;
  const observedAt = overrides.observedAt ?? fixedArrival;
  const facts = {
    id: `made-${String(made).padStart(6, '0')}`,
    subject: { kind: 'turn', id: 'turn-1' },
    observedAt,
    receivedAt: addSeconds(observedAt, 2),
    source: 'by-hand' satisfies EntrySource,
    by: { personId: 'p-conductor', name: 'M. Tolland' },
  };
  return { ...facts, ...contents[kind], ...overrides };
}

/** A step done, so many seconds after the scheduled arrival of `aTurn()`. */
export function aStepDone(
  step: string,
  afterArrivalSeconds: number,
  overrides: EntryOverrides<'step-done'> = {},
): Entry {
  const observedAt = addSeconds(fixedArrival, afterArrivalSeconds);
  return anEntry('step-done', { step, observedAt, ...overrides });
}
