import {
  parseInstant,
  type Anchor,
  type Doer,
  type EntrySource,
  type Health,
  type Instant,
  type Place,
  type StepKind,
  type StepState,
  type TurnKind,
  type TurnState,
  type WireAlert,
  type WireReading,
  type WireStep,
  type WireTurn,
  type WireTurnMatters,
} from '@stubpost/shared';

/** One step as the board draws it. */
export interface StepNow {
  key: string;
  label: string;
  shortLabel: string;
  kind: StepKind;
  doer: Doer;
  place: Place;
  anchor: Anchor;
  holdsDeparture: boolean;
  state: StepState;
  /** The entry that counts for the step. */
  entryId: string | null;
  /** Counted from the recorded or expected arrival and the departure as it now is to be. */
  dueAt: Instant | null;
  /** Counted from the timetable alone; does not move with a late arrival. */
  plannedDueAt: Instant | null;
  latestFinishAt: Instant | null;
  /** When work on it can begin by the forecast; null when it is done or there is no forecast. */
  startAt: Instant | null;
  /** Recorded time when done, else the forecast finish. */
  finishAt: Instant | null;
  doneAt: Instant | null;
  source: EntrySource | null;
  by: string | null;
  saidBy: string | null;
  reading: WireReading | null;
  remarks: readonly string[];
}

/** A turn with its times as numbers, at one moment. The table, the row heads and the picture all read this. */
export interface TurnNow {
  id: string;
  version: number;
  kind: TurnKind;
  terminal: string;
  planId: string;
  serviceDate: string;
  zone: string;
  extra: boolean;
  /** The number people call the turn by: the outbound train, of a tie-up the inbound one. */
  train: string;
  inboundTrain: string | null;
  outboundTrain: string | null;
  track: string | null;
  plannedTrack: string | null;
  set: string | null;
  cars: readonly string[];
  crew: WireTurn['crew'];
  state: TurnState;
  health: Health;
  scheduledArrivalAt: Instant | null;
  expectedArrivalAt: Instant | null;
  arrivedAt: Instant | null;
  scheduledDepartureAt: Instant | null;
  heldUntil: Instant | null;
  holdReason: string | null;
  expectedDepartureAt: Instant | null;
  departedAt: Instant | null;
  steps: readonly StepNow[];
  readyAt: Instant | null;
  slackSeconds: number | null;
  criticalSteps: readonly string[];
  alerts: readonly WireAlert[];
  blueSignal: { since: Instant | null; by: string } | null;
  /** Handbrakes by the records: how many were set and released, and on which cars they still stand. */
  securement: NonNullable<WireTurn['securement']> | null;
  annulled: { at: Instant | null; reason: string } | null;
  shortByDesign: boolean;
  lastHeardAt: Instant | null;
  findings: readonly string[];
  noteCount: number;
  /** What people still have to settle about the turn, and what they reported. */
  matters: WireTurnMatters;
}

const instant = (text: string | null | undefined): Instant | null =>
  text === null || text === undefined ? null : parseInstant(text);

function readStep(step: WireStep): StepNow {
  return {
    key: step.key,
    label: step.label,
    shortLabel: step.shortLabel,
    kind: step.kind,
    doer: step.doer,
    place: step.place,
    anchor: step.anchor,
    holdsDeparture: step.holdsDeparture,
    state: step.state,
    entryId: step.entryId,
    dueAt: instant(step.dueAt),
    plannedDueAt: instant(step.dueAt),
    latestFinishAt: instant(step.latestFinishAt),
    startAt: null,
    finishAt: instant(step.forecastFinishAt),
    doneAt: instant(step.doneAt),
    source: step.source,
    by: step.by,
    saidBy: step.saidBy,
    reading: step.reading,
    remarks: step.remarks,
  };
}

/** Reads a turn as the service gave it, with the figures of the moment at which the service computed them. */
export function readTurn(turn: WireTurn): TurnNow {
  return {
    id: turn.id,
    version: turn.version,
    kind: turn.kind,
    terminal: turn.terminal,
    planId: turn.planId,
    serviceDate: turn.serviceDate,
    zone: turn.zone,
    extra: turn.extra,
    train: turn.outbound?.train ?? turn.inbound?.train ?? '',
    inboundTrain: turn.inbound?.train ?? null,
    outboundTrain: turn.outbound?.train ?? null,
    track: turn.track,
    plannedTrack: turn.plannedTrack,
    set: turn.set,
    cars: turn.cars,
    crew: turn.crew,
    state: turn.state,
    health: turn.health,
    ...readTimes(turn),
    steps: turn.steps.map(readStep),
    readyAt: instant(turn.forecast.readyAt),
    slackSeconds: turn.forecast.slackSeconds,
    criticalSteps: turn.forecast.criticalSteps,
    alerts: turn.alerts,
    blueSignal:
      turn.blueSignal === null ? null : { since: instant(turn.blueSignal.since), by: turn.blueSignal.by },
    annulled: turn.annulled === null ? null : { at: instant(turn.annulled.at), reason: turn.annulled.reason },
    securement: turn.securement ?? null,
    shortByDesign: turn.shortByDesign,
    lastHeardAt: instant(turn.lastHeardAt),
    findings: turn.findings,
    noteCount: turn.noteCount,
    matters: mattersOf(turn),
  };
}

function mattersOf(turn: WireTurn): WireTurnMatters {
  const { inQuestion, asksAgreement, corrections, defects, tiedUp, briefedBy, reliefs } = turn;
  return { inQuestion, asksAgreement, corrections, defects, tiedUp, briefedBy, reliefs };
}

function readTimes(turn: WireTurn) {
  return {
    scheduledArrivalAt: instant(turn.inbound?.scheduledArrivalAt),
    expectedArrivalAt: instant(turn.inbound?.expectedArrivalAt),
    arrivedAt: instant(turn.inbound?.actualArrivalAt),
    scheduledDepartureAt: instant(turn.outbound?.scheduledDepartureAt),
    heldUntil: instant(turn.outbound?.heldUntil),
    holdReason: turn.outbound?.holdReason ?? null,
    expectedDepartureAt: instant(turn.outbound?.expectedDepartureAt),
    departedAt: instant(turn.outbound?.actualDepartureAt),
  };
}
