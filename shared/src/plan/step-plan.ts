import type { CalendarDate } from '../lib/instant';

/** What a step is about; gives its mark on the timeline. */
export const STEP_KINDS = ['securement', 'brake-test', 'ends', 'air', 'movement', 'boarding'] as const;
export type StepKind = (typeof STEP_KINDS)[number];

/** Who does a step. `crew` is any member of the crew. */
export const DOERS = ['conductor', 'engineer', 'crew'] as const;
export type Doer = (typeof DOERS)[number];

/** Where the doer stands: in a cab or on the ground. Upper and lower half of the bar on the timeline. */
export const PLACES = ['cab', 'ground'] as const;
export type Place = (typeof PLACES)[number];

/** What a step's due time is counted from. */
export const ANCHORS = ['arrival', 'departure'] as const;
export type Anchor = (typeof ANCHORS)[number];

/** What a step asks its doer to read off or count. */
export const READINGS = ['count', 'cars', 'brakePipePsi', 'leakage'] as const;
export type ReadingKey = (typeof READINGS)[number];

/** One step of a plan. All durations are whole seconds. */
export interface PlanStep {
  /** Stable key inside the plan, e.g. `handbrake-set`. */
  key: string;
  /** Full wording for panels and the phone. */
  label: string;
  /** Wording for columns and lists. */
  shortLabel: string;
  kind: StepKind;
  doer: Doer;
  place: Place;
  anchor: Anchor;
  /** Due = anchor + this; negative before the departure. */
  offsetSeconds: number;
  shortSeconds: number;
  typicalSeconds: number;
  longSeconds: number;
  /** Keys of steps that must be finished first; the words `arrival` and `departure` stand for the anchors' events. */
  after: string[];
  /** The step may not begin before departure + this (so −360 is six minutes before); null where it may. */
  notBeforeSeconds: number | null;
  /** How long past its due time a step is not yet called overdue. */
  toleranceSeconds: number;
  /** Whether the train waits for this step. A step after departure never holds it. */
  holdsDeparture: boolean;
  reads: ReadingKey[];
  /** The railroad's own words on how the step is done: plain text. Absent when it has none. */
  instruction?: string | undefined;
  /** Whether the step is recorded from the controlling cab. Absent: as `place` says. */
  inCab?: boolean | undefined;
}

/**
 * Whether a step is recorded from the controlling cab, so that the safety briefing comes first where the railroad
 * asks for it. A conductor's act in a cab that is not the controlling one is marked `inCab: false`.
 * Source: 49 CFR 220.305 to 220.309 (a briefing before a device is used in the controlling cab); text of the current
 * edition not confirmed by the railroad.
 */
export function isInCab(step: Pick<PlanStep, 'inCab' | 'place'>): boolean {
  return step.inCab ?? step.place === 'cab';
}

/** A versioned template of steps; a turn keeps the version that was in force on its service day. */
export interface StepPlan {
  id: string;
  /** Which template this is a version of, e.g. `push-pull-turn`. */
  key: string;
  name: string;
  version: number;
  effectiveFrom: CalendarDate;
  steps: PlanStep[];
}
