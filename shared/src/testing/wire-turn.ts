import { wireSecurementOf } from '../contract/turn-from-wire';
import type { WireStep, WireTurn } from '../contract/turns';
import { turnMattersOf } from '../contract/wire-turn-matters';
import { forecastTurn, type StepForecast } from '../forecast/forecast';
import { forecastInputOf } from '../forecast/forecast-input';
import { assessedTurnOf } from '../lateness/assessed-turn';
import { healthOf } from '../lateness/health';
import { shortByDesignSeconds } from '../lateness/horizon';
import { shippedLatenessSettings } from '../lateness/settings';
import { formatInstant, type Instant } from '../lib/instant';
import { formatClock } from '../lib/zone-time';
import type { PlanStep } from '../plan/step-plan';
import type { TurnFacts } from '../turn/facts';
import { formatEntryFinding, stepRemarks } from '../turn/finding-words';
import { stepStateOf } from '../turn/life';
import { fixedZone } from './builders';

const iso = (instant: Instant | null): string | null => (instant === null ? null : formatInstant(instant));
const clock = (instant: Instant): string => formatClock(instant, fixedZone, { seconds: true });

/** A turn as a route would give it at `now`, from its facts: terminal HBR, no alerts, the cars unknown. */
export function aWireTurn(facts: TurnFacts, now: Instant, overrides: Partial<WireTurn> = {}): WireTurn {
  const forecast = forecastTurn(forecastInputOf(facts), now);
  const assessed = assessedTurnOf(facts, forecast, now);
  const settings = { ...shippedLatenessSettings, formatTime: clock, formatExactTime: clock };
  const { planned, blueSignal, annulled } = facts;
  return {
    id: planned.id,
    version: facts.entries.length + 1,
    kind: planned.kind,
    terminal: 'HBR',
    zone: fixedZone,
    serviceDate: planned.serviceDate,
    state: assessed.state,
    health: healthOf(assessed, settings, now),
    extra: false,
    reverses: planned.reverses,
    track: facts.track,
    plannedTrack: facts.track === planned.track ? null : planned.track,
    set: facts.set,
    cars: [],
    crew: facts.crew.map(({ as, personId, name }) => ({ as, personId, name })),
    planId: 'plan-1',
    inbound: inboundOf(facts),
    outbound: outboundOf(facts, forecast.expectedDepartureAt),
    steps: facts.steps.map((step, index) => aWireStep(facts, step, forecast.steps[index], now)),
    forecast: {
      readyAt: iso(forecast.readyAt),
      readyAtNineInTen: null,
      chanceOnTime: null,
      slackSeconds: forecast.slackSeconds,
      criticalSteps: [...forecast.criticalSteps],
    },
    alerts: [],
    blueSignal: blueSignal === null ? null : { since: formatInstant(blueSignal.since), by: blueSignal.by },
    annulled: annulled === null ? null : { at: formatInstant(annulled.at), reason: annulled.reason },
    securement: wireSecurementOf(facts, now),
    shortByDesign: shortByDesignSeconds(assessed) > 0,
    lastHeardAt: iso(facts.lastHeardAt),
    findings: facts.findings.map((finding) => formatEntryFinding(finding, facts.steps, clock)),
    noteCount: facts.notes.length,
    ...turnMattersOf(facts),
    computedAt: formatInstant(now),
    ...overrides,
  };
}

function inboundOf({ planned, expectedArrivalAt, arrivalAt }: TurnFacts): WireTurn['inbound'] {
  if (planned.inboundTrain === null || planned.scheduledArrivalAt === null) return null;
  return {
    train: planned.inboundTrain,
    scheduledArrivalAt: formatInstant(planned.scheduledArrivalAt),
    expectedArrivalAt: iso(expectedArrivalAt),
    actualArrivalAt: iso(arrivalAt),
  };
}

function outboundOf(facts: TurnFacts, expectedDepartureAt: Instant | null): WireTurn['outbound'] {
  const { outboundTrain, scheduledDepartureAt } = facts.planned;
  if (outboundTrain === null || scheduledDepartureAt === null) return null;
  return {
    train: outboundTrain,
    scheduledDepartureAt: formatInstant(scheduledDepartureAt),
    heldUntil: iso(facts.heldUntil),
    holdReason: facts.holdReason,
    expectedDepartureAt: iso(expectedDepartureAt),
    actualDepartureAt: iso(facts.departureAt),
  };
}

function aWireStep(
  facts: TurnFacts,
  step: PlanStep,
  times: StepForecast | undefined,
  now: Instant,
): WireStep {
  const account = facts.done[step.key];
  const { key, label, shortLabel, kind, doer, place, anchor, holdsDeparture } = step;
  return {
    ...{ key, label, shortLabel, kind, doer, place, anchor, holdsDeparture },
    dueAt: iso(times?.dueAt ?? null),
    latestFinishAt: iso(times?.latestFinishAt ?? null),
    forecastFinishAt: iso(times?.finishAt ?? null),
    state: times === undefined ? 'not-due' : stepStateOf(facts, step, times, now),
    doneAt: iso(account?.at ?? null),
    source: account?.source ?? null,
    by: account?.by?.name ?? null,
    saidBy: account?.saidBy ?? null,
    reading: account?.reading ?? null,
    entryId: account?.entryId ?? null,
    remarks: stepRemarks(facts, key, clock),
  };
}
