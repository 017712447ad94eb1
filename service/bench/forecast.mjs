import { createRequire } from 'node:module';
import { goal, interleave, note } from './measure.mjs';

const require = createRequire(import.meta.url);
const { defaultStepPlanSteps, outlookOf, stepsFor } = require('@stubpost/shared');
const { DirectedGraph } = require('graphology');
const { topologicalSort } = require('graphology-dag');
const toposort = require('toposort');

const turns = 10_000;
const steps = stepsFor(defaultStepPlanSteps, { kind: 'turn', reverses: true });
const base = Date.parse('2026-03-03T22:00:00Z');

const inputs = Array.from({ length: turns }, (_, index) => {
  const arrival = base + index * 7000;
  const departure = arrival + (900 + (index % 600)) * 1000;
  const doneAt = {};
  for (const step of steps.slice(0, index % 5)) doneAt[step.key] = arrival + step.offsetSeconds * 1000;
  return {
    kind: 'turn',
    steps,
    scheduledArrivalAt: arrival,
    expectedArrivalAt: null,
    actualArrivalAt: index % 2 === 0 ? arrival + 20_000 : null,
    scheduledDepartureAt: departure,
    heldUntil: null,
    actualDepartureAt: null,
    doneAt,
  };
});

/** Forward and backward pass over an order of keys; the same rules as the product's, written for any graph. */
function passes(order, input, now) {
  const byKey = new Map(steps.map((step) => [step.key, step]));
  const arrival = input.actualArrivalAt ?? Math.max(input.scheduledArrivalAt, now);
  const departure = input.scheduledDepartureAt;
  const finish = new Map();
  let ready = arrival;
  for (const key of order) {
    const step = byKey.get(key);
    if (step === undefined || step.after.includes('departure')) continue;
    let start = -Infinity;
    for (const before of step.after)
      start = Math.max(start, finish.get(before) ?? (before === 'arrival' ? arrival : -Infinity));
    if (step.notBeforeSeconds !== null) start = Math.max(start, departure + step.notBeforeSeconds * 1000);
    const elapsed = now - start;
    const typical = step.typicalSeconds * 1000;
    const long = step.longSeconds * 1000;
    const expected =
      elapsed <= typical ? start + typical : elapsed < long ? now + Math.round((long - elapsed) / 3) : now;
    const at = input.doneAt[key] ?? expected;
    finish.set(key, at);
    if (step.holdsDeparture) ready = Math.max(ready, at);
  }
  const latest = new Map();
  for (const key of [...order].reverse()) {
    const step = byKey.get(key);
    if (step === undefined || !step.holdsDeparture) continue;
    const own = latest.get(key) ?? departure;
    latest.set(key, own);
    for (const before of step.after)
      latest.set(before, Math.min(latest.get(before) ?? Infinity, own - step.typicalSeconds * 1000));
  }
  return ready;
}

const edges = steps.flatMap((step) => step.after.map((before) => [before, step.key]));

function withToposort(now) {
  let sum = 0;
  for (const input of inputs) sum += passes(toposort(edges), input, now) % 1_000_003;
  return sum;
}

function withGraphLibrary(now) {
  let sum = 0;
  for (const input of inputs) {
    const graph = new DirectedGraph();
    for (const [from, to] of edges) graph.mergeEdge(from, to);
    sum += passes(topologicalSort(graph), input, now) % 1_000_003;
  }
  return sum;
}

function withShared(now) {
  let sum = 0;
  for (const input of inputs) sum += (outlookOf(input, now).readyAt ?? 0) % 1_000_003;
  return sum;
}

const timed = (work) => () => {
  const now = base + 3_600_000;
  const started = process.hrtime.bigint();
  const sum = work(now);
  if (sum !== withSharedSum) throw new Error(`the sums differ: ${sum} and ${withSharedSum}`);
  return Number(process.hrtime.bigint() - started) / 1e6;
};
const withSharedSum = withShared(base + 3_600_000);

/** P7: the forecast of 10,000 turns against a sort per turn and against a general graph library; all give the same sum. */
export async function benchForecast({ rounds }) {
  const figures = await interleave(
    [
      { name: 'ours', run: timed(withShared) },
      { name: 'toposort', run: timed(withToposort) },
      { name: 'graph library', run: timed(withGraphLibrary) },
    ],
    rounds,
  );
  for (const [name, value] of figures)
    note(`${name.padEnd(14)} ${value.toFixed(1).padStart(8)} ms for ${turns} turns`);
  goal({
    id: 'P7',
    what: 'forecast, times as fast as a topological sort per turn',
    value: figures.get('toposort') / figures.get('ours'),
    atLeast: 15,
  });
  goal({
    id: 'P7',
    what: 'forecast, times as fast as a graph library',
    value: figures.get('graph library') / figures.get('ours'),
    atLeast: 100,
  });
}
