import type { StepPlan, WireStep, WireTurn } from '@stubpost/shared';

/** 3 March 2026 in New York, whose clocks stand five hours behind UTC that day. `at('17:18')` is 22:18 UTC. */
export function at(clock: string): string {
  const [hours = 0, minutes = 0, seconds = 0] = clock.split(':').map(Number);
  return new Date(Date.UTC(2026, 2, 3, hours + 5, minutes, seconds)).toISOString();
}

/** The same moment as epoch milliseconds. */
export const ms = (clock: string): number => Date.parse(at(clock));

type PlanRow = Pick<
  StepPlan['steps'][number],
  'key' | 'label' | 'shortLabel' | 'kind' | 'doer' | 'place' | 'anchor' | 'after' | 'reads'
> & { offset: number; times: [number, number, number]; notBefore?: number; holds?: boolean };

const rows: PlanRow[] = [
  {
    key: 'handbrake-set',
    label: 'Handbrake set',
    shortLabel: 'Handbrake set',
    kind: 'securement',
    doer: 'conductor',
    place: 'ground',
    anchor: 'arrival',
    after: ['arrival'],
    reads: ['count', 'cars'],
    offset: 120,
    times: [45, 75, 150],
  },
  {
    key: 'cab-brake-check',
    label: 'Cab brake check',
    shortLabel: 'Cab brake check',
    kind: 'brake-test',
    doer: 'engineer',
    place: 'cab',
    anchor: 'arrival',
    after: ['handbrake-set'],
    reads: [],
    offset: 360,
    times: [40, 60, 120],
  },
  {
    key: 'ends-changed',
    label: 'Brake cut out, ends changed',
    shortLabel: 'Ends changed',
    kind: 'ends',
    doer: 'engineer',
    place: 'cab',
    anchor: 'arrival',
    after: ['cab-brake-check'],
    reads: [],
    offset: 600,
    times: [120, 210, 420],
  },
  {
    key: 'engineer-in-cab',
    label: 'Engineer in the leaving cab, brake cut in and applied',
    shortLabel: 'In leaving cab',
    kind: 'movement',
    doer: 'engineer',
    place: 'cab',
    anchor: 'departure',
    after: ['ends-changed'],
    reads: ['brakePipePsi'],
    offset: -300,
    times: [10, 20, 90],
    notBefore: -360,
  },
  {
    key: 'handbrake-released',
    label: 'Handbrake released, train held by the air brake',
    shortLabel: 'Handbrake off',
    kind: 'securement',
    doer: 'conductor',
    place: 'ground',
    anchor: 'departure',
    after: ['engineer-in-cab'],
    reads: ['count', 'cars'],
    offset: -240,
    times: [30, 50, 120],
  },
  {
    key: 'brakes-released',
    label: 'Brakes released, air charged',
    shortLabel: 'Air charged',
    kind: 'air',
    doer: 'engineer',
    place: 'cab',
    anchor: 'departure',
    after: ['handbrake-released'],
    reads: ['brakePipePsi'],
    offset: -120,
    times: [40, 60, 150],
  },
  {
    key: 'leaving-end-test',
    label: 'Brake test from the leaving end',
    shortLabel: 'Leaving-end test',
    kind: 'brake-test',
    doer: 'engineer',
    place: 'cab',
    anchor: 'departure',
    after: ['brakes-released'],
    reads: [],
    offset: -60,
    times: [30, 45, 90],
  },
  {
    key: 'running-test',
    label: 'Running brake test',
    shortLabel: 'Running test',
    kind: 'brake-test',
    doer: 'engineer',
    place: 'cab',
    anchor: 'departure',
    after: ['departure'],
    reads: [],
    offset: 300,
    times: [0, 0, 0],
    holds: false,
  },
];

/** The eight-step push-pull plan as the tests of this feature use it. */
export const pushPullPlan: StepPlan = {
  id: 'plan-1',
  key: 'push-pull-turn',
  name: 'Push-pull turn',
  version: 1,
  effectiveFrom: '2026-01-01',
  steps: rows.map(({ offset, times: [short, typical, long], notBefore, holds, ...row }) => ({
    ...row,
    offsetSeconds: offset,
    shortSeconds: short,
    typicalSeconds: typical,
    longSeconds: long,
    notBeforeSeconds: notBefore ?? null,
    toleranceSeconds: 0,
    holdsDeparture: holds ?? true,
  })),
};

const dues = ['17:20', '17:24', '17:28', '17:35', '17:36', '17:38', '17:39', '17:45'];
const latest = ['17:32:35', '17:33:35', '17:37:05', '17:37:25', '17:38:15', '17:39:15', '17:40', '17:45'];

/** A step of the default plan, not done. */
export function aWireStep(key: string, changes: Partial<WireStep> = {}): WireStep {
  const index = pushPullPlan.steps.findIndex((step) => step.key === key);
  const step = pushPullPlan.steps[index];
  if (step === undefined) throw new Error(`no step ${key}`);
  return {
    key,
    label: step.label,
    shortLabel: step.shortLabel,
    kind: step.kind,
    doer: step.doer,
    place: step.place,
    anchor: step.anchor,
    dueAt: at(dues[index] ?? '17:40'),
    latestFinishAt: at(latest[index] ?? '17:40'),
    forecastFinishAt: null,
    state: 'not-due',
    doneAt: null,
    source: null,
    by: null,
    saidBy: null,
    reading: null,
    entryId: null,
    remarks: [],
    holdsDeparture: step.holdsDeparture,
    ...changes,
  };
}

/** Train 1741 in at 17:18, 1742 out at 17:40 on track 3 with set 41; it stands since 17:18:20, nothing recorded. */
export function aWireTurn(changes: Partial<WireTurn> = {}): WireTurn {
  return {
    id: '0c3c9a5e-6f5a-4b57-9f1f-5c9c2b7c8a01',
    version: 3,
    kind: 'turn',
    terminal: 'HBR',
    zone: 'America/New_York',
    serviceDate: '2026-03-03',
    state: 'arrived',
    health: 'on-plan',
    extra: false,
    reverses: true,
    track: '3',
    plannedTrack: null,
    set: '41',
    cars: ['1501', '1402', '1404', '1406', '1408', '1410', '1412', '1414'],
    crew: [{ as: 'conductor', personId: 'p-ortiz', name: 'Ortiz' }],
    planId: 'plan-1',
    inbound: {
      train: '1741',
      scheduledArrivalAt: at('17:18'),
      expectedArrivalAt: null,
      actualArrivalAt: at('17:18:20'),
    },
    outbound: {
      train: '1742',
      scheduledDepartureAt: at('17:40'),
      heldUntil: null,
      holdReason: null,
      expectedDepartureAt: at('17:40'),
      actualDepartureAt: null,
    },
    steps: pushPullPlan.steps.map((step) => aWireStep(step.key)),
    forecast: {
      readyAt: at('17:37'),
      readyAtNineInTen: at('17:38'),
      chanceOnTime: null,
      slackSeconds: 200,
      criticalSteps: [],
    },
    alerts: [],
    blueSignal: null,
    annulled: null,
    shortByDesign: false,
    lastHeardAt: at('17:18:20'),
    findings: [],
    noteCount: 0,
    computedAt: at('17:22:41'),
    ...changes,
  };
}

/** The turn with these steps done: key to the time it was done. */
export function withDone(
  turn: WireTurn,
  done: Record<string, string>,
  changes: Partial<WireStep> = {},
): WireTurn {
  return {
    ...turn,
    steps: turn.steps.map((step) => {
      const clock = done[step.key];
      if (clock === undefined) return step;
      return {
        ...step,
        state: 'done',
        doneAt: at(clock),
        source: 'by-hand',
        by: 'Ortiz',
        entryId: `entry-${step.key}`,
        ...changes,
      };
    }),
  };
}
