import type { PlanStep } from './step-plan';

/** Key of the step plan every terminal starts with. */
export const defaultStepPlanKey = 'push-pull-turn';

/** Name of the step plan every terminal starts with. */
export const defaultStepPlanName = 'Push-pull turn';

/**
 * Seconds past its due time after which an open step is called overdue, in the default plan. Our choice: a minute,
 * the time it takes to say a thing by radio and write it down.
 */
const defaultToleranceSeconds = 60;

const arrivalSide = {
  anchor: 'arrival',
  notBeforeSeconds: null,
  toleranceSeconds: defaultToleranceSeconds,
  holdsDeparture: true,
} as const;
const departureSide = { ...arrivalSide, anchor: 'departure' } as const;

/**
 * The turn of a push-pull train at a stub-end track: secured, checked and changed over after the arrival; manned,
 * released, charged and tested from the leaving end before the departure; a running test after it. Common practice
 * without a published source; every railroad edits it. At typical durations the shortest turn is 520 s.
 */
export const defaultStepPlanSteps: PlanStep[] = [
  {
    ...arrivalSide,
    key: 'handbrake-set',
    label: 'Handbrake set',
    shortLabel: 'Handbrake set',
    kind: 'securement',
    doer: 'conductor',
    place: 'ground',
    offsetSeconds: 120,
    shortSeconds: 45,
    typicalSeconds: 75,
    longSeconds: 150,
    after: ['arrival'],
    reads: ['count', 'cars'],
  },
  {
    ...arrivalSide,
    key: 'cab-brake-check',
    label: 'Cab brake check',
    shortLabel: 'Cab brake check',
    kind: 'brake-test',
    doer: 'engineer',
    place: 'cab',
    offsetSeconds: 360,
    shortSeconds: 40,
    typicalSeconds: 60,
    longSeconds: 120,
    after: ['handbrake-set'],
    reads: [],
  },
  {
    ...arrivalSide,
    key: 'ends-changed',
    label: 'Brake cut out, ends changed',
    shortLabel: 'Ends changed',
    kind: 'ends',
    doer: 'engineer',
    place: 'cab',
    offsetSeconds: 600,
    shortSeconds: 120,
    typicalSeconds: 210,
    longSeconds: 420,
    after: ['cab-brake-check'],
    reads: [],
  },
  {
    ...departureSide,
    key: 'engineer-in-cab',
    label: 'Engineer in the leaving cab, brake cut in and applied',
    shortLabel: 'In leaving cab',
    kind: 'movement',
    doer: 'engineer',
    place: 'cab',
    offsetSeconds: -300,
    shortSeconds: 10,
    typicalSeconds: 20,
    longSeconds: 90,
    after: ['ends-changed'],
    notBeforeSeconds: -360,
    reads: ['brakePipePsi'],
  },
  {
    ...departureSide,
    key: 'handbrake-released',
    label: 'Handbrake released, train held by the air brake',
    shortLabel: 'Handbrake off',
    kind: 'securement',
    doer: 'conductor',
    place: 'ground',
    offsetSeconds: -240,
    shortSeconds: 30,
    typicalSeconds: 50,
    longSeconds: 120,
    after: ['engineer-in-cab'],
    reads: ['count', 'cars'],
  },
  {
    ...departureSide,
    key: 'brakes-released',
    label: 'Brakes released, air charged',
    shortLabel: 'Air charged',
    kind: 'air',
    doer: 'engineer',
    place: 'cab',
    offsetSeconds: -120,
    shortSeconds: 40,
    typicalSeconds: 60,
    longSeconds: 150,
    after: ['handbrake-released'],
    reads: ['brakePipePsi'],
  },
  {
    ...departureSide,
    key: 'leaving-end-test',
    label: 'Brake test from the leaving end',
    shortLabel: 'Leaving-end test',
    kind: 'brake-test',
    doer: 'engineer',
    place: 'cab',
    offsetSeconds: -60,
    shortSeconds: 30,
    typicalSeconds: 45,
    longSeconds: 90,
    after: ['brakes-released'],
    reads: [],
  },
  {
    ...departureSide,
    key: 'running-test',
    label: 'Running brake test',
    shortLabel: 'Running test',
    kind: 'brake-test',
    doer: 'engineer',
    place: 'cab',
    offsetSeconds: 300,
    shortSeconds: 0,
    typicalSeconds: 0,
    longSeconds: 0,
    after: ['departure'],
    holdsDeparture: false,
    reads: [],
  },
];
