import {
  type Forecast,
  type Instant,
  type LatenessSettings,
  type PlanStep,
  type StepForecast,
  type TurnFacts,
  type WireStep,
  type WireTurn,
  assessedTurnOf,
  forecastInputOf,
  forecastTurn,
  formatEntryFinding,
  formatInstant,
  healthOf,
  shortByDesignSeconds,
  stepRemarks,
  stepStateOf,
  wireSecurementOf,
} from '@stubpost/shared';
import { wireAlertOf } from '../alerts/alert-record';
import type { TurnFile } from './turn-file';

const wireInstant = (instant: Instant | null): string | null => (instant === null ? null : formatInstant(instant));

/** A turn as every route gives it, computed for one moment under the rules of its terminal. */
export function wireTurnOf(file: TurnFile, rules: LatenessSettings, now: Instant): WireTurn {
  const { record, facts } = file;
  const forecast = forecastTurn(forecastInputOf(facts), now);
  const assessed = assessedTurnOf(facts, forecast, now);
  const clock = rules.formatExactTime;
  return {
    id: record.id,
    version: record.version,
    kind: record.kind,
    terminal: record.terminalCode,
    zone: record.zone,
    serviceDate: record.serviceDate,
    state: assessed.state,
    health: healthOf(assessed, rules, now),
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
    steps: facts.steps.map((step, index) => wireStepOf({ facts, step, times: forecast.steps[index], clock, now })),
    forecast: {
      readyAt: wireInstant(forecast.readyAt),
      readyAtNineInTen: null,
      chanceOnTime: null,
      slackSeconds: forecast.slackSeconds,
      criticalSteps: [...forecast.criticalSteps],
    },
    alerts: file.alerts.map(wireAlertOf),
    blueSignal:
      facts.blueSignal === null ? null : { since: formatInstant(facts.blueSignal.since), by: facts.blueSignal.by },
    annulled:
      facts.annulled === null ? null : { at: formatInstant(facts.annulled.at), reason: facts.annulled.reason },
    securement: wireSecurementOf(facts, now),
    shortByDesign: shortByDesignSeconds(assessed) > 0,
    lastHeardAt: wireInstant(facts.lastHeardAt),
    findings: facts.findings.map((finding) => formatEntryFinding(finding, facts.steps, clock)),
    noteCount: facts.notes.length,
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
  clock: (instant: Instant) => string;
  now: Instant;
}

function wireStepOf({ facts, step, times, clock, now }: StepQuestion): WireStep {
  if (times === undefined) throw new Error(`step ${step.key} has no forecast`);
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
    state: stepStateOf(facts, step, times, now),
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
