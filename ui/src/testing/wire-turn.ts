import {
  assessedTurnOf,
  forecastInputOf,
  forecastTurn,
  formatEntryFinding,
  formatInstant,
  healthOf,
  latenessSettingsOf,
  parseInstant,
  shippedThresholds,
  shortByDesignSeconds,
  stepRemarks,
  stepsFor,
  stepStateOf,
  turnFrom,
  turnMattersOf,
  wireSecurementOf,
  type Entry,
  type EntryKind,
  type Forecast,
  type Instant,
  type PlannedTurn,
  type PlanStep,
  type StepForecast,
  type TurnFacts,
  type WireAlert,
  type WireStep,
  type WireStepPlan,
  type WireTurn,
} from '@stubpost/shared';
import { anEntry, aPlan, aTurn, fixedServiceDate, fixedZone } from '@stubpost/shared/testing';

/** A moment of the fixed service day by the terminal's clock: `clockAt('17:26:40')`. */
export function clockAt(clock: string): Instant {
  const instant = parseInstant(`${fixedServiceDate}T${clock.length === 5 ? `${clock}:00` : clock}-05:00`);
  if (instant === null) throw new RangeError(`Not a time: ${clock}`);
  return instant;
}

/** The default plan as the service gives it. */
export const wirePlan: WireStepPlan = {
  ...aPlan(),
  terminal: 'VAR',
  createdAt: '2026-01-01T00:00:00.000Z',
  createdBy: null,
};

/** The settings every terminal starts with, in the fixed zone. */
export const fixedSettings = latenessSettingsOf(shippedThresholds, fixedZone);

let entryCount = 0;
/** A UUID that counts up, since ids on the wire must be ones. */
export function madeUuid(): string {
  entryCount += 1;
  return `00000000-0000-4000-8000-${String(entryCount).padStart(12, '0')}`;
}

type Overrides<Kind extends EntryKind> = Parameters<typeof anEntry<Kind>>[1];

/** An entry observed at a clock time of the fixed day, heard two seconds later. */
export function entryAt<Kind extends EntryKind>(
  kind: Kind,
  clock: string,
  overrides?: Overrides<Kind>,
): Entry {
  return anEntry(kind, { id: madeUuid(), observedAt: clockAt(clock), ...overrides } as Overrides<Kind>);
}

export interface WireTurnParts {
  planned?: Partial<PlannedTurn>;
  entries?: readonly Entry[];
  cars?: readonly string[];
  crew?: WireTurn['crew'];
  alerts?: readonly WireAlert[];
  version?: number;
  terminal?: string;
  extra?: boolean;
}

const conductor = { as: 'conductor', personId: 'p-conductor', name: 'M. Tolland' } as const;
const engineer = { as: 'engineer', personId: 'p-engineer', name: 'P. Varga' } as const;

/** A turn as the service would give it at `now`, worked out from entries by the functions of `shared`. */
export function aWireTurn(parts: WireTurnParts, now: Instant): WireTurn {
  const planned = aTurn(parts.planned);
  const entries = (parts.entries ?? []).filter((entry) => entry.receivedAt <= now);
  const carried = (parts.crew ?? [conductor, engineer]).map((member) => ({
    ...member,
    since: null,
    carriedOver: true,
  }));
  const facts = turnFrom(planned, stepsFor(wirePlan.steps, planned), entries, carried);
  const forecast = forecastTurn(forecastInputOf(facts), now);
  const assessed = assessedTurnOf(facts, forecast, now);
  const clock = fixedSettings.formatExactTime;
  return {
    id: planned.id,
    version: parts.version ?? entries.length + 1,
    kind: planned.kind,
    terminal: parts.terminal ?? 'VAR',
    zone: fixedZone,
    serviceDate: planned.serviceDate,
    state: assessed.state,
    health: healthOf(assessed, fixedSettings, now),
    extra: parts.extra ?? false,
    reverses: planned.reverses,
    track: facts.track,
    plannedTrack: facts.track === planned.track ? null : planned.track,
    set: facts.set,
    cars: [...(parts.cars ?? ['3312', '2216', '2209', '2235', '4107'])],
    crew: facts.crew.map(({ as, personId, name }) => ({ as, personId, name })),
    planId: wirePlan.id,
    ...movementOf(facts, forecast),
    steps: facts.steps.map((step, index) => stepOf(facts, step, forecast.steps[index], now)),
    forecast: {
      readyAt: textOf(forecast.readyAt),
      readyAtNineInTen: null,
      chanceOnTime: null,
      slackSeconds: forecast.slackSeconds,
      criticalSteps: [...forecast.criticalSteps],
    },
    alerts: [...(parts.alerts ?? [])],
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
    lastHeardAt: textOf(facts.lastHeardAt),
    findings: facts.findings.map((finding) => formatEntryFinding(finding, facts.steps, clock)),
    noteCount: facts.notes.length,
    ...turnMattersOf(facts),
    computedAt: formatInstant(now),
  };
}

const textOf = (instant: Instant | null): string | null => (instant === null ? null : formatInstant(instant));

function movementOf(facts: TurnFacts, forecast: Forecast): Pick<WireTurn, 'inbound' | 'outbound'> {
  const { planned } = facts;
  const { inboundTrain, outboundTrain, scheduledArrivalAt: arrives, scheduledDepartureAt: leaves } = planned;
  return {
    inbound:
      inboundTrain === null || arrives === null
        ? null
        : {
            train: inboundTrain,
            scheduledArrivalAt: formatInstant(arrives),
            expectedArrivalAt: textOf(facts.expectedArrivalAt),
            actualArrivalAt: textOf(facts.arrivalAt),
          },
    outbound:
      outboundTrain === null || leaves === null
        ? null
        : {
            train: outboundTrain,
            scheduledDepartureAt: formatInstant(leaves),
            heldUntil: textOf(facts.heldUntil),
            holdReason: facts.holdReason,
            expectedDepartureAt: textOf(forecast.expectedDepartureAt),
            actualDepartureAt: textOf(facts.departureAt),
          },
  };
}

function stepOf(facts: TurnFacts, step: PlanStep, times: StepForecast | undefined, now: Instant): WireStep {
  if (times === undefined) throw new Error(`step ${step.key} has no forecast`);
  const account = facts.done[step.key];
  const { key, label, shortLabel, kind, doer, place, anchor, holdsDeparture } = step;
  return {
    ...{ key, label, shortLabel, kind, doer, place, anchor, holdsDeparture },
    dueAt: formatInstant(times.dueAt),
    latestFinishAt: formatInstant(times.latestFinishAt),
    forecastFinishAt: formatInstant(times.finishAt),
    state: stepStateOf(facts, step, times, now),
    doneAt: textOf(account?.at ?? null),
    source: account?.source ?? null,
    by: account?.by?.name ?? null,
    saidBy: account?.saidBy ?? null,
    reading: account?.reading ?? null,
    entryId: account?.entryId ?? null,
    remarks: stepRemarks(facts, step.key, fixedSettings.formatExactTime),
  };
}

/** A standing alert of a turn, raised 17:25:20. */
export function aWireAlert(overrides: Partial<WireAlert> = {}): WireAlert {
  return {
    id: 'alert-1',
    version: 1,
    cause: 'late-departure',
    priority: 'act-soon',
    state: 'raised',
    terminal: 'VAR',
    turnId: 'turn-1',
    subject: 'Track 3, train 1742',
    raisedAt: formatInstant(clockAt('17:25:20')),
    takenAt: null,
    takenBy: null,
    setAsideUntil: null,
    setAsideReason: null,
    clearedAt: null,
    closedAt: null,
    closedCause: null,
    text: 'Cab brake check not recorded, latest 17:27',
    action: 'Ask if it is made, or send a second engineer to the leaving cab.',
    actor: 'dispatcher, engineer P. Varga',
    byWhen: null,
    lines: [],
    previousId: null,
    ...overrides,
  };
}
