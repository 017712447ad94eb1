import {
  type Forecast,
  type Instant,
  type LatenessSettings,
  type PlanStep,
  type StepForecast,
  type StepState,
  type TurnFacts,
  type WireStep,
  type WireTurn,
  formatEntryFinding,
  formatInstant,
  shortByDesignSeconds,
  stepRemarks,
  turnMattersOf,
  wireSecurementOf,
} from '@stubpost/shared';
import { wireAlertOf } from '../alerts/alert-record';
import type { TurnFile } from './turn-file';
import type { TurnMoment } from './turn-moment';

const wireInstant = (instant: Instant | null): string | null =>
  instant === null ? null : formatInstant(instant);

/** A turn as every route gives it, at one moment; times in words follow the rules of its terminal. */
export function wireTurnOf(file: TurnFile, moment: TurnMoment, rules: LatenessSettings): WireTurn {
  const { record, facts } = file;
  const { now, forecast, assessed } = moment;
  const clock = rules.formatExactTime;
  return {
    id: record.id,
    version: record.version,
    kind: record.kind,
    terminal: record.terminalCode,
    zone: record.zone,
    serviceDate: record.serviceDate,
    state: assessed.state,
    health: moment.health,
    extra: record.origin === 'extra',
    reverses: record.reverses,
    track: facts.track,
    plannedTrack: facts.track === record.plannedTrack ? null : record.plannedTrack,
    set: facts.set,
    cars: [...file.cars],
    crew: facts.crew.map(({ as, personId, name }) => ({ as, personId, name })),
    planId: record.planId,
    inbound: inboundOf(file),
    outbound: outboundOf(file, forecast),
    steps: facts.steps.map((step, index) =>
      wireStepOf({ facts, step, times: forecast.steps[index], state: moment.stepStates[index], clock }),
    ),
    forecast: {
      readyAt: wireInstant(forecast.readyAt),
      readyAtNineInTen: null,
      chanceOnTime: null,
      slackSeconds: forecast.slackSeconds,
      criticalSteps: [...forecast.criticalSteps],
    },
    alerts: file.alerts.map(wireAlertOf),
    blueSignal:
      facts.blueSignal === null
        ? null
        : { since: formatInstant(facts.blueSignal.since), by: facts.blueSignal.by },
    annulled:
      facts.annulled === null
        ? null
        : { at: formatInstant(facts.annulled.at), reason: facts.annulled.reason },
    securement: wireSecurementOf(facts, now),
    shortByDesign: shortByDesignSeconds(assessed) > 0,
    lastHeardAt: wireInstant(facts.lastHeardAt),
    findings: facts.findings.map((finding) => formatEntryFinding(finding, facts.steps, clock)),
    noteCount: facts.notes.length,
    ...turnMattersOf(facts),
    computedAt: formatInstant(now),
  };
}

function inboundOf({ record, facts }: TurnFile): WireTurn['inbound'] {
  if (record.inboundTrain === null || record.scheduledArrivalAt === null) return null;
  return {
    train: record.inboundTrain,
    scheduledArrivalAt: formatInstant(record.scheduledArrivalAt),
    expectedArrivalAt: wireInstant(facts.expectedArrivalAt),
    actualArrivalAt: wireInstant(facts.arrivalAt),
  };
}

function outboundOf({ record, facts }: TurnFile, forecast: Forecast): WireTurn['outbound'] {
  if (record.outboundTrain === null || record.scheduledDepartureAt === null) return null;
  return {
    train: record.outboundTrain,
    scheduledDepartureAt: formatInstant(record.scheduledDepartureAt),
    heldUntil: wireInstant(facts.heldUntil),
    holdReason: facts.holdReason,
    expectedDepartureAt: wireInstant(forecast.expectedDepartureAt),
    actualDepartureAt: wireInstant(facts.departureAt),
  };
}

interface StepQuestion {
  facts: TurnFacts;
  step: PlanStep;
  times: StepForecast | undefined;
  state: StepState | undefined;
  clock: (instant: Instant) => string;
}

function wireStepOf({ facts, step, times, state, clock }: StepQuestion): WireStep {
  if (times === undefined || state === undefined) throw new Error(`step ${step.key} has no forecast`);
  const account = facts.done[step.key];
  return {
    key: step.key,
    label: step.label,
    shortLabel: step.shortLabel,
    kind: step.kind,
    doer: step.doer,
    place: step.place,
    anchor: step.anchor,
    dueAt: formatInstant(times.dueAt),
    latestFinishAt: formatInstant(times.latestFinishAt),
    forecastFinishAt: formatInstant(times.finishAt),
    state,
    doneAt: wireInstant(account?.at ?? null),
    source: account?.source ?? null,
    by: account?.by?.name ?? null,
    saidBy: account?.saidBy ?? null,
    reading: account?.reading ?? null,
    entryId: account?.entryId ?? null,
    remarks: stepRemarks(facts, step.key, clock),
    holdsDeparture: step.holdsDeparture,
  };
}
