import { seededRandom } from '@stubpost/shared/testing';

/** Who writes about the same turns without knowing of the others. */
export const WRITERS = ['phone A', 'phone B', 'dispatcher', 'supervisor'] as const;
export type Writer = (typeof WRITERS)[number];

/** One entry as somebody sends it. */
export interface Told {
  id: string;
  writer: Writer;
  /** Which of the story's turns it is about. */
  turn: number;
  request: Record<string, unknown>;
}

/** Which story, and in which order it comes in. */
export interface StoryQuestion {
  seed: number;
  order: number;
  /** Eight hexadecimal digits that all ids of this telling begin with; their order is the same in every telling. */
  telling: string;
  people: Record<Writer, string>;
  turns: number;
  /** An instant so many seconds after the start. */
  at: (seconds: number) => string;
}

/** A story with all its entries, and the batches in which they come in, retries and mistaken ids included. */
export interface Story {
  entries: Told[];
  batches: Told[][];
}

const steps = [
  'handbrake-set',
  'cab-brake-check',
  'ends-changed',
  'engineer-in-cab',
  'handbrake-released',
  'brakes-released',
  'leaving-end-test',
  'running-test',
];

type Chance = () => number;
const pick = <Item>(chance: Chance, items: readonly Item[]): Item => {
  const item = items[Math.floor(chance() * items.length)];
  if (item === undefined) throw new Error('nothing to pick from');
  return item;
};

/** The same seed tells the same story; the order decides only how it comes in. */
export function tellStory(question: StoryQuestion): Story {
  const entries = entriesOf(question);
  const chance = seededRandom(question.seed * 31 + question.order * 7919 + 1);
  const arriving = question.order % 2 === 0 ? inQueues(entries, chance) : shuffled(entries, chance);
  return { entries, batches: inBatches(withRetries(arriving, chance), chance) };
}

function entriesOf({ seed, telling, people, turns, at }: StoryQuestion): Told[] {
  const chance = seededRandom(seed);
  const entries: Told[] = [];
  const add = (writer: Writer, turn: number, seconds: number, fields: Record<string, unknown>): Told => {
    const id = `${telling}-0000-4000-8000-${String(entries.length).padStart(12, '0')}`;
    const source = writer === 'dispatcher' ? { source: 'by-radio', saidBy: 'Ortiz' } : { source: 'by-hand' };
    const told = { id, writer, turn, request: { id, observedAt: at(seconds), ...source, ...fields } };
    entries.push(told);
    return told;
  };
  for (let turn = 0; turn < turns; turn += 1)
    tellTurn({ name: telling, chance, turn, start: turn * 1800, people, at, add });
  return entries;
}

interface TurnTelling {
  /** What the ids of this telling begin with. */
  name: string;
  chance: Chance;
  turn: number;
  start: number;
  people: Record<Writer, string>;
  at: (seconds: number) => string;
  add: (writer: Writer, turn: number, seconds: number, fields: Record<string, unknown>) => Told;
}

const reason = 'wrong step';

function tellTurn(telling: TurnTelling): void {
  const { chance, turn, start, people, add } = telling;
  const anyone = (): Writer => pick(chance, ['phone A', 'phone B', 'dispatcher']);
  const phone = (): Writer => pick(chance, ['phone A', 'phone B']);
  add('dispatcher', turn, start, { kind: 'crew', person: people['phone A'], as: 'conductor' });
  add(anyone(), turn, start + Math.floor(chance() * 90), { kind: 'arrival' });
  if (chance() < 0.5) add(anyone(), turn, start + 100, { kind: 'arrival' });
  for (const [index, step] of steps.entries()) {
    if (chance() < 0.15) continue;
    const seconds = start + 60 + index * 90 + Math.floor(chance() * 60);
    const reading = step.startsWith('handbrake') ? { reading: { count: 1 + Math.floor(chance() * 2) } } : {};
    const done = add(anyone(), turn, seconds, { kind: 'step-done', step, ...reading });
    if (chance() < 0.4) tellAgain(telling, done, { step, seconds, reading });
  }
  add('dispatcher', turn, start + 200, { kind: 'track', track: pick(chance, ['1', '2', '5']) });
  if (chance() < 0.3)
    add('dispatcher', turn, start + 300, { kind: 'hold', until: telling.at(start + 1100), reason });
  if (chance() < 0.3)
    add(phone(), turn, start + 350, { kind: 'cannot-do', step: pick(chance, steps), reason });
  if (chance() < 0.4) add(phone(), turn, start + 400, { kind: 'defect', car: '5512', cause: 'door' });
  const [out, taker] = [people['phone A'], people['phone B']];
  const relief = { kind: 'relief', out, in: taker, as: 'conductor', faceToFace: chance() < 0.5 };
  if (chance() < 0.4) add(phone(), turn, start + 500, relief);
  if (chance() < 0.3) add('dispatcher', turn, start + 520, { kind: 'set', set: `T${telling.name}` });
  if (chance() < 0.3)
    add('dispatcher', turn, start - 60, { kind: 'expected-arrival', expectedAt: telling.at(start + 45) });
  if (chance() < 0.3) add(phone(), turn, start + 540, { kind: 'briefing' });
  if (chance() < 0.2) add('dispatcher', turn, start + 560, { kind: 'annulled', reason });
  if (chance() < 0.2) {
    const handbrakes = { count: 2, cars: ['5512'] };
    add(phone(), turn, start + 580, { kind: 'tied-up', handbrakes, checks: ['lights'] });
  }
  add(phone(), turn, start + 600, { kind: 'note', note: `note ${Math.floor(chance() * 100)}` });
  if (chance() < 0.8) add(anyone(), turn, start + 900 + Math.floor(chance() * 60), { kind: 'departure' });
}

/** A second account, a withdrawal, a correction that waits for approval, an agreement or a ruling. */
function tellAgain(
  { chance, turn, at, add }: TurnTelling,
  done: Told,
  { step, seconds, reading }: { step: string; seconds: number; reading: object },
): void {
  const own = done.writer;
  const other = pick(chance, ['phone A', 'phone B', 'dispatcher'] as const);
  const later = seconds + 30 + Math.floor(chance() * 200);
  const target = done.id;
  switch (Math.floor(chance() * 5)) {
    case 0:
      add(other, turn, later, { kind: 'step-done', step, ...reading });
      break;
    case 1:
      add(own, turn, later, { kind: 'withdrawn', target, reason });
      add(other, turn, later + 20, { kind: 'step-done', step, ...reading });
      break;
    case 2: {
      const madeAt = at(later + Math.floor(chance() * 1500));
      const instead = chance() < 0.5 ? { reading: { count: 1 } } : { observedAt: at(seconds + 15) };
      const fields = {
        kind: 'corrected',
        target,
        madeAt,
        reason: 'misread',
        observedAt: undefined,
        ...instead,
      };
      const asked = add(own, turn, later, fields);
      const decision = pick(chance, ['correction-approved', 'correction-declined', null]);
      if (decision !== null)
        add('supervisor', turn, later + 5, {
          kind: decision,
          target: asked.id,
          ...(decision === 'correction-declined' ? { reason } : {}),
        });
      break;
    }
    case 3: {
      const account = add(other, turn, later, { kind: 'step-done', step, ...reading });
      add('dispatcher', turn, later + 60, { kind: 'ruled', target, considered: [target, account.id] });
      break;
    }
    default:
      add(
        pick(chance, ['phone A', 'phone B']),
        turn,
        later,
        chance() < 0.6 ? { kind: 'agreed', target } : { kind: 'disagreed', target, reason },
      );
  }
}

/** Each writer's entries in the order they were written, the writers through each other; one may be long offline. */
function inQueues(entries: readonly Told[], chance: Chance): Told[] {
  const queues = WRITERS.map((writer) => entries.filter((told) => told.writer === writer));
  const offline = pick(chance, queues);
  const arriving: Told[] = [];
  for (let left = entries.length; left > 0; left -= 1) {
    const waiting = queues.filter((queue) => queue.length > 0);
    const awake = waiting.filter((queue) => queue !== offline);
    const told = pick(chance, awake.length > 0 ? awake : waiting).shift();
    if (told !== undefined) arriving.push(told);
  }
  return arriving;
}

function shuffled(entries: readonly Told[], chance: Chance): Told[] {
  return entries
    .map((told) => ({ told, place: chance() }))
    .sort((a, b) => a.place - b.place)
    .map(({ told }) => told);
}

/** Some entries are sent again, soon or much later, and some ids are used for something else once they are taken. */
function withRetries(arriving: readonly Told[], chance: Chance): Told[] {
  const all = [...arriving];
  for (const told of arriving) {
    const after = all.indexOf(told) + 1;
    const place = after + Math.floor(chance() * (all.length - after + 1));
    if (chance() < 0.3) all.splice(place, 0, told);
    else if (chance() < 0.1) all.splice(place, 0, mistaken(told));
  }
  return all;
}

const mistaken = (told: Told): Told => ({
  ...told,
  request: {
    id: told.id,
    kind: 'note',
    observedAt: told.request['observedAt'],
    source: 'by-hand',
    note: 'another',
  },
});

/** Up to five at a time; an id that was mistaken for another never races with its owner. */
function inBatches(arriving: readonly Told[], chance: Chance): Told[][] {
  const batches: Told[][] = [];
  for (let next = 0; next < arriving.length;) {
    const batch = arriving.slice(next, next + 1 + Math.floor(chance() * 5));
    const isMistaken = (told: Told) =>
      batch.some(({ id, request }) => id === told.id && request !== told.request);
    const end = batch.findIndex((told) => isMistaken(told));
    batches.push(end > 0 ? batch.slice(0, end) : end === 0 ? batch.slice(0, 1) : batch);
    next += batches.at(-1)?.length ?? 1;
  }
  return batches;
}
