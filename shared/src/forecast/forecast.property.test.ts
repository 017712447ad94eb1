import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { addSeconds, secondsBetween, type Instant } from '../lib/instant';
import { defaultStepPlanSteps } from '../plan/default-step-plan';
import { orderSteps } from '../plan/step-network';
import type { PlanStep } from '../plan/step-plan';
import { aStep } from '../testing/builders';
import { forecastTurn } from './forecast';
import type { ForecastInput } from './forecast-input';
import { scheduleNetwork } from './network';

const arrival: Instant = Date.UTC(2026, 2, 3, 22, 0, 0);
const durations = fc
  .tuple(fc.integer({ min: 0, max: 120 }), fc.integer({ min: 0, max: 240 }), fc.integer({ min: 0, max: 300 }))
  .map(([short, more, most]) => ({
    shortSeconds: short,
    typicalSeconds: short + more,
    longSeconds: short + more + most,
  }));

/** One to eight steps of a turn; each waits for the arrival or for steps made before it, and holds the departure. */
const arbitrarySteps: fc.Arbitrary<PlanStep[]> = fc
  .array(
    fc.tuple(durations, fc.array(fc.nat(7), { maxLength: 2 }), fc.option(fc.integer({ min: -600, max: 0 }))),
    {
      minLength: 1,
      maxLength: 8,
    },
  )
  .map((parts) =>
    parts.map(([times, before, notBefore], index) => {
      const after = [...new Set(before)].filter((place) => place < index).map((place) => `step-${place}`);
      return aStep({
        ...times,
        key: `step-${index}`,
        after: after.length > 0 ? after : ['arrival'],
        anchor: notBefore === null ? 'arrival' : 'departure',
        notBeforeSeconds: notBefore,
      });
    }),
  );

const runs = { seed: 520, numRuns: 500 };

function inputOf(
  steps: readonly PlanStep[],
  layoverSeconds: number,
  doneAt: Record<string, Instant>,
): ForecastInput {
  return {
    kind: 'turn',
    steps,
    scheduledArrivalAt: arrival,
    expectedArrivalAt: null,
    actualArrivalAt: arrival,
    scheduledDepartureAt: addSeconds(arrival, layoverSeconds),
    heldUntil: null,
    actualDepartureAt: null,
    doneAt,
  };
}

/** Steps done one after the other from the arrival on, as many as there are gaps, in an order the plan allows. */
function doneFrom(steps: readonly PlanStep[], gaps: readonly number[]): Record<string, Instant> {
  let at = arrival;
  const doneAt: Record<string, Instant> = {};
  for (const [index, step] of (orderSteps(steps) ?? []).entries()) {
    const gap = gaps[index];
    if (gap === undefined) break;
    at = addSeconds(at, gap);
    doneAt[step.key] = at;
  }
  return doneAt;
}

const lastOf = (doneAt: Record<string, Instant>): Instant => Math.max(arrival, ...Object.values(doneAt));
const layovers = fc.integer({ min: 200, max: 2400 });
const gaps = fc.array(fc.integer({ min: 0, max: 400 }), { maxLength: 7 });
const waits = fc.integer({ min: 0, max: 1500 });

describe('the forecast', () => {
  it('between entries never moves ready-by earlier, and later only when a step has outlived its typical time', () => {
    fc.assert(
      fc.property(arbitrarySteps, layovers, gaps, waits, waits, (steps, layover, done, wait, more) => {
        const input = inputOf(steps, layover, doneFrom(steps, done));
        const now = addSeconds(lastOf(input.doneAt), wait);
        const later = addSeconds(now, more);
        const before = forecastTurn(input, now).readyAt ?? 0;
        const after = forecastTurn(input, later);
        expect(after.readyAt).toBeGreaterThanOrEqual(before);
        if ((after.readyAt ?? 0) === before) return;
        const outlived = after.steps.filter((forecast, index) => {
          const typical = steps[index]?.typicalSeconds ?? 0;
          return (
            input.doneAt[forecast.key] === undefined && secondsBetween(forecast.startAt, later) > typical
          );
        });
        expect(outlived).not.toEqual([]);
      }),
      runs,
    );
  });

  it('never makes ready-by earlier when the same step is ticked later, each judged at its own tick', () => {
    fc.assert(
      fc.property(arbitrarySteps, layovers, gaps, waits, waits, (steps, layover, done, wait, more) => {
        const doneAt = doneFrom(steps, done);
        const next = (orderSteps(steps) ?? []).find((step) => doneAt[step.key] === undefined);
        fc.pre(next !== undefined);
        const readyWhenTickedAt = (tick: Instant): number =>
          forecastTurn(inputOf(steps, layover, { ...doneAt, [next?.key ?? '']: tick }), tick).readyAt ?? 0;
        const tick = addSeconds(lastOf(doneAt), wait);
        expect(readyWhenTickedAt(addSeconds(tick, more))).toBeGreaterThanOrEqual(readyWhenTickedAt(tick));
      }),
      runs,
    );
  });

  it('of an idle turn without not-before times is the longest path of the network', () => {
    fc.assert(
      fc.property(arbitrarySteps, layovers, (withNotBefore, layover) => {
        const steps = withNotBefore.map((step) => ({ ...step, notBeforeSeconds: null }));
        const network = scheduleNetwork(
          steps.map(({ key, typicalSeconds, after }) => ({
            id: key,
            duration: typicalSeconds,
            after: after.filter((before) => before !== 'arrival'),
          })),
          layover,
        );
        if (!network.ok) throw new Error(network.error.code);
        const forecast = forecastTurn(inputOf(steps, layover, {}), arrival);
        expect(forecast.readyAt).toBe(addSeconds(arrival, network.value.finish));
        expect(forecast.slackSeconds).toBe(Math.min(...network.value.activities.map(({ slack }) => slack)));
        for (const { id, latestFinish, earliestFinish } of network.value.activities) {
          const step = forecast.steps.find(({ key }) => key === id);
          expect(step?.latestFinishAt).toBe(addSeconds(arrival, latestFinish));
          expect(step?.finishAt).toBe(addSeconds(arrival, earliestFinish));
        }
      }),
      runs,
    );
  });

  it('names a critical chain whose every step waits for the one before it, up to the departure', () => {
    fc.assert(
      fc.property(arbitrarySteps, layovers, gaps, waits, (steps, layover, done, wait) => {
        const input = inputOf(steps, layover, doneFrom(steps, done));
        const { criticalSteps } = forecastTurn(input, addSeconds(lastOf(input.doneAt), wait));
        const isAllDone = steps.every(({ key }) => input.doneAt[key] !== undefined);
        expect(criticalSteps.length > 0).toBe(!isAllDone);
        for (const [index, key] of criticalSteps.entries()) {
          const step = steps.find((each) => each.key === key);
          if (index > 0) expect(step?.after).toContain(criticalSteps[index - 1]);
        }
      }),
      runs,
    );
  });

  it('with the default plan worked in order is short by exactly what the departure is late', () => {
    fc.assert(
      fc.property(layovers, gaps, waits, (layover, done, wait) => {
        const input = inputOf(defaultStepPlanSteps, layover, doneFrom(defaultStepPlanSteps, done));
        const { slackSeconds, readyAt, departureAnchorAt } = forecastTurn(
          input,
          addSeconds(lastOf(input.doneAt), wait),
        );
        const late = Math.floor(((departureAnchorAt ?? 0) - (readyAt ?? 0)) / 1000);
        if ((slackSeconds ?? 0) < 0 || late < 0) expect(slackSeconds).toBe(late);
        else expect(slackSeconds).toBeGreaterThanOrEqual(late);
      }),
      runs,
    );
  });
});
