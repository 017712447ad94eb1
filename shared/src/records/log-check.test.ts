import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { aSealedLog, seededRandom } from '../testing';
import { ENTRY_KINDS } from '../turn/entry';
import { LogCheck } from './log-check';
import { formatEntryFault, formatLogFault, formatLogNote } from './log-words';
import type { LogHead, LogVerdict } from './log-verdict';

const sha256 = (text: string): string => createHash('sha256').update(text, 'utf8').digest('hex');

/** A body of each kind that says everything an entry can say. */
const bodies = ENTRY_KINDS.map((kind, index) => ({
  subject: { kind: 'turn', id: `turn-${index}` },
  terminal: 'HBR',
  serviceDate: '2026-03-03',
  kind,
  observedAt: '2026-03-03T22:00:00.000Z',
  source: 'by-radio',
  by: { id: 'p-1', name: 'Zoë Ångström' },
  saidBy: 'Ortiz “R.” \u2028',
  clockOffsetMilliseconds: -120,
  reading: { count: 2, cars: ['5512', '5513'], brakePipePsi: 90.5 },
  faceToFace: false,
  in: null,
}));
const log = aSealedLog({ bodies, sha256 });
const { lines } = log;
const headAt = (sequence: number): LogHead => log.heads[sequence - 1] as LogHead;
const newest = headAt(lines.length);

function checked(of: readonly string[], heads: readonly LogHead[] = []): LogVerdict {
  const check = new LogCheck({ sha256, heads });
  for (const line of of) check.take(line);
  return check.end();
}

/** The first fault, and the rest of the verdict out of the way. */
const firstOf = (of: readonly string[], heads: readonly LogHead[] = []) => checked(of, heads).faults[0];
const withLine = (index: number, line: string): string[] =>
  lines.map((each, at) => (at === index ? line : each));
const swapped = (a: number, b: number): string[] =>
  lines.map((line, at) => lines[at === a ? b : at === b ? a : at] ?? line);

describe('a log as it was exported', () => {
  it('is whole, and says that nothing shows a cut tail without a published head', () => {
    const verdict = checked(lines);
    expect(verdict).toMatchObject({
      isWhole: true,
      entries: lines.length,
      faults: [],
      first: { sequence: 1 },
      last: newest,
      metHead: null,
      notes: [{ kind: 'no-head' }],
    });
    expect(formatLogNote({ kind: 'no-head' })).toContain('cannot be seen');
  });

  it('meets every head that was published, and says what no head vouches for yet', () => {
    expect(checked(lines, log.heads)).toMatchObject({
      isWhole: true,
      metHeads: lines.length,
      metHead: newest,
      notes: [],
    });
    expect(checked(lines, [headAt(3), headAt(5)])).toMatchObject({
      isWhole: true,
      metHeads: 2,
      metHead: headAt(5),
      notes: [{ kind: 'after-head', from: 6, to: lines.length }],
    });
  });

  it('is whole without the bodies that were taken out, and names them', () => {
    const taken = lines.map((line, index) => (index % 4 === 0 ? withoutBody(line) : line));
    expect(checked(taken, [newest])).toMatchObject({
      isWhole: true,
      notes: [{ kind: 'without-body', count: Math.ceil(lines.length / 4) }],
    });
  });

  it('may begin on a later day, chained to the head before', () => {
    const later = lines.slice(4);
    expect(checked(later, [headAt(4), newest])).toMatchObject({
      isWhole: true,
      first: { sequence: 5 },
      notes: [{ kind: 'before-start', to: 4 }],
    });
    expect(firstOf(later, [newest])).toEqual({ kind: 'beginning', line: 1, to: 4 });
    expect(firstOf(later)).toEqual({ kind: 'beginning', line: 1, to: 4 });
    const wrong = { sequence: 4, hash: sha256('another log') };
    expect(checked(lines, [headAt(4), wrong]).faults).toMatchObject([{ kind: 'not-the-head', head: wrong }]);
    expect(firstOf(later, [wrong])).toMatchObject({ kind: 'wrong-start', line: 1, sequence: 5, head: wrong });
  });

  it('is empty before the first entry, unless a head says otherwise', () => {
    expect(checked([])).toMatchObject({ isWhole: true, entries: 0, first: null, last: null });
    expect(firstOf([], [headAt(2)])).toMatchObject({ kind: 'cut', lastSequence: 0, head: headAt(2) });
  });
});

describe('a changed entry', () => {
  const cases = lines.flatMap((line, index) =>
    variantsOf(JSON.parse(line) as Json).map(({ path, value }) => ({ index, path, value })),
  );

  it('is found and located, whichever field of whichever kind was changed, taken out or added', () => {
    expect(cases.length).toBeGreaterThan(ENTRY_KINDS.length * 50);
    for (const { index, path, value } of cases) {
      const fault = firstOf(withLine(index, canonical(value)));
      expect({ path, line: fault?.line }).toEqual({ path, line: index + 1 });
    }
  });

  it.each([
    ['body', { body: { kind: 'note' } }],
    ['bodyHash', { bodyHash: sha256('x') }],
    ['hash', { hash: sha256('x') }],
    ['previousHash', { previousHash: sha256('x') }],
    ['sequence', { sequence: 77 }],
    ['envelope', { id: '11111111-1111-4111-8111-111111111111' }],
    ['envelope', { receivedAt: '2026-03-03T22:00:50.001Z' }],
    ['several', { bodyHash: sha256('x'), hash: sha256('y') }],
  ])('is told apart by its part: %s', (part, changes) => {
    const changed = canonical({ ...(JSON.parse(lines[6] ?? '') as object), ...changes });
    const verdict = checked(withLine(6, changed));
    expect(verdict.faults).toEqual([
      { kind: 'changed', part, line: 7, sequence: 7, id: expect.any(String) as string },
    ]);
  });

  it.each(['id', 'hash', 'previousHash', 'sequence', 'body'])(
    'is found in the very first entry as well: %s',
    (name) => {
      const first = JSON.parse(lines[0] ?? '') as Record<string, Json>;
      const value =
        { id: 'x', hash: sha256('x'), previousHash: sha256('x'), sequence: 9, body: {} }[name] ?? null;
      const verdict = checked(withLine(0, canonical({ ...first, [name]: value })));
      expect(verdict.faults).toMatchObject([{ kind: 'changed', line: 1, sequence: 1 }]);
    },
  );

  it('that was sealed anew is named by what the next one was chained to', () => {
    for (let index = 0; index < lines.length - 1; index += 1) {
      expect(firstOf(withLine(index, resealed(index)))).toMatchObject({
        kind: 'resealed',
        line: index + 1,
        sequence: index + 1,
        next: { line: index + 2, sequence: index + 2 },
      });
    }
  });

  it('whose whole following chain was made anew shows at the next published head', () => {
    const forged = aSealedLog({
      bodies: bodies.map((body, at) => (at === 3 ? { kind: 'x' } : body)),
      sha256,
    });
    expect(checked(forged.lines).isWhole).toBe(true);
    expect(firstOf(forged.lines, [headAt(2), headAt(8), newest])).toMatchObject({
      kind: 'not-the-head',
      sequence: 8,
      head: headAt(8),
    });
  });

  it.each([
    ['a blank', (line: string) => line.replace(':', ': ')],
    [
      'another order',
      (line: string) =>
        JSON.stringify(Object.fromEntries(Object.entries(JSON.parse(line) as object).reverse())),
    ],
    ['a carriage return', (line: string) => `${line}\r`],
    ['an escape', (line: string) => line.replace('HBR', String.raw`\u0048BR`)],
    ['a member twice', (line: string) => line.replace('{"body"', '{"hash":"","body"')],
    ['a number in another form', (line: string) => line.replace('90.5', '90.50')],
  ])('that says the same, but with %s, was touched', (_, touch) => {
    expect(firstOf(withLine(2, touch(lines[2] ?? '')))).toMatchObject({
      kind: 'rewritten',
      line: 3,
      sequence: 3,
    });
  });
});

describe('any one byte', () => {
  const bytes = Buffer.from(lines.map((line) => `${line}\n`).join(''));

  it('changed at random places is found, in the line it lies in', () => {
    const random = seededRandom(20260303);
    for (let round = 0; round < 1000; round += 1) {
      const place = Math.floor(random() * bytes.length);
      const flipped = Buffer.from(bytes);
      flipped[place] = (flipped[place] ?? 0) ^ (1 << Math.floor(random() * 8));
      const line = bytes.subarray(0, place).toString('latin1').split('\n').length;
      const fault = checkedBytes(flipped, [newest]).faults[0];
      expect({ round, place, line: fault?.line }).toEqual({ round, place, line });
    }
  });

  it('taken out, put in, doubled or moved in any number and place is found', () => {
    const random = seededRandom(4);
    const place = (): number => Math.floor(random() * (bytes.length - 200));
    for (let round = 0; round < 300; round += 1) {
      const [from, to] = [place(), place()];
      const part = bytes.subarray(from, from + 1 + Math.floor(random() * 199));
      const isTaken = random() < 0.5;
      const rest = isTaken ? without(bytes, from, part.length) : bytes;
      const isPut = !isTaken || random() < 0.5;
      const touched = isPut ? Buffer.concat([rest.subarray(0, to), part, rest.subarray(to)]) : rest;
      if (touched.equals(bytes)) continue;
      const verdict = checkedBytes(touched, [newest]);
      expect({ round, isWhole: verdict.isWhole }).toEqual({ round, isWhole: false });
      for (const fault of verdict.faults) expect(formatLogFault(fault)).not.toBe('');
    }
  });

  it('missing at the end, and any longer tail, is found against a published head', () => {
    const random = seededRandom(7);
    for (let round = 0; round < 100; round += 1) {
      const length = round < 3 ? bytes.length - round - 1 : Math.floor(random() * bytes.length);
      const verdict = checkedBytes(bytes.subarray(0, length), [newest]);
      expect({ length, isWhole: verdict.isWhole }).toEqual({ length, isWhole: false });
    }
    expect(checkedBytes(bytes, [newest]).isWhole).toBe(true);
  });
});

describe('a line', () => {
  const places = lines.map((_, index) => index);

  it.each(places)('taken out is named: no. %i and one', (index) => {
    const left = lines.toSpliced(index, 1);
    const number = index + 1;
    const fault = firstOf(left, [newest]);
    if (index === 0) expect(fault).toEqual({ kind: 'beginning', line: 1, to: 1 });
    else if (number === lines.length) expect(fault).toMatchObject({ kind: 'cut', lastSequence: index });
    else expect(fault).toEqual({ kind: 'missing', line: number, from: number, to: number });
  });

  it('taken out with others is named with them', () => {
    const left = [...lines.slice(0, 3), ...lines.slice(6, 9), ...lines.slice(10)];
    expect(checked(left, [newest]).faults).toEqual([
      { kind: 'missing', line: 4, from: 4, to: 6 },
      { kind: 'missing', line: 7, from: 10, to: 10 },
    ]);
  });

  it.each(places.slice(0, -1))('swapped with the next is named: line %i and one', (index) => {
    const verdict = checked(swapped(index, index + 1), [newest]);
    expect(verdict.faults[0]).toMatchObject({ kind: 'moved', line: index + 1, sequence: index + 2 });
    expect(verdict.faults[1]).toMatchObject({ kind: 'moved', line: index + 2, sequence: index + 1 });
    expect(verdict.faults).toHaveLength(2);
  });

  it('swapped with one far away is named at the first place', () => {
    const random = seededRandom(11);
    for (let round = 0; round < 100; round += 1) {
      const a = Math.floor(random() * (lines.length - 1));
      const b = a + 1 + Math.floor(random() * (lines.length - 1 - a));
      expect(firstOf(swapped(a, b), [newest])).toMatchObject({ kind: 'moved', line: a + 1, sequence: b + 1 });
    }
  });

  it.each(places)('doubled is named: line %i and one', (index) => {
    const doubled = lines.toSpliced(index, 0, lines[index] ?? '');
    expect(checked(doubled, [newest]).faults).toMatchObject([
      { kind: 'repeated', isSame: true, line: index + 2, sequence: index + 1 },
    ]);
  });

  it('doubled further down is named there', () => {
    expect(checked(lines.toSpliced(9, 0, lines[2] ?? ''), [newest]).faults).toMatchObject([
      { kind: 'repeated', line: 10, sequence: 3 },
    ]);
  });

  it.each(places.slice(0, -1))('forged, sealed and chained in front of line %i and one is named', (index) => {
    const added = lines.toSpliced(index, 0, resealed(index));
    expect(checked(added, [newest]).faults).toMatchObject([
      { kind: 'repeated', isSame: false, line: index + 1, sequence: index + 1 },
    ]);
  });

  it.each([
    ['nothing', '', 'empty'],
    ['no JSON', '{"body":', 'not-json'],
    ['a list', '[]', 'not-an-entry'],
    [
      'an entry without a number',
      canonical({ ...(JSON.parse(lines[0] ?? '') as object), sequence: null }),
      'member',
    ],
    ['half of a surrogate pair', (lines[3] ?? '').replace('HBR', String.raw`\ud800`), 'not-json'],
  ])('that holds %s is unreadable', (_, text, reason) => {
    expect(checked(lines.toSpliced(4, 0, text), [newest]).faults).toMatchObject([
      { kind: 'unreadable', line: 5, reason },
    ]);
    expect(checked(withLine(4, text), [newest]).faults).toMatchObject([
      { kind: 'unreadable', line: 5, reason },
    ]);
  });
});

describe('the words', () => {
  it('say where, which entry and what for every kind of fault', () => {
    const broken = [
      withLine(1, '{'),
      withLine(1, `${lines[1]} `),
      withLine(1, canonical({ ...(JSON.parse(lines[1] ?? '') as object), body: {} })),
      withLine(1, resealed(1)),
      lines.toSpliced(1, 1),
      swapped(1, 2),
      lines.toSpliced(1, 0, lines[1] ?? ''),
      lines.slice(1),
      lines.slice(0, 2),
    ];
    for (const of of broken) {
      for (const fault of checked(of, [newest]).faults)
        expect(formatLogFault(fault)).toMatch(/^Line \d+\b.*(no\. \d|cannot be read).*\.$/);
    }
    expect(formatEntryFault({ kind: 'missing', line: 7, from: 7, to: 7 })).toBe('No. 7 is missing.');
    expect(formatEntryFault({ kind: 'moved', line: 7, sequence: 8, id: 'e8' })).toBe(
      'No. 8 (e8): does not stand in the order of the log.',
    );
    expect(formatLogFault({ kind: 'missing', line: 1204, from: 1204, to: 1206 })).toBe(
      'Line 1,204: no. 1,204 to 1,206 are missing before it.',
    );
  });
});

type Json = null | boolean | number | string | Json[] | { [name: string]: Json };

/** Every way to change one member of a line: another value, gone, one more. */
function variantsOf(value: Json, path = ''): { path: string; value: Json }[] {
  if (Array.isArray(value)) {
    const inside = value.flatMap((item, index) =>
      variantsOf(item, `${path}[${index}]`).map((changed) => ({
        ...changed,
        value: value.map((each, at) => (at === index ? changed.value : each)),
      })),
    );
    return [
      ...inside,
      { path: `${path}[+]`, value: [...value, null] },
      { path: `${path}[-]`, value: value.slice(1) },
    ];
  }
  if (typeof value === 'object' && value !== null) {
    const inside = Object.entries(value).flatMap(([name, member]) => [
      ...variantsOf(member, `${path}.${name}`).map((changed) => ({
        ...changed,
        value: { ...value, [name]: changed.value },
      })),
      {
        path: `${path}.${name}-`,
        value: Object.fromEntries(Object.entries(value).filter(([other]) => other !== name)),
      },
    ]);
    return [...inside, { path: `${path}.+`, value: { ...value, more: 1 } }];
  }
  return [{ path, value: otherThan(value) }];
}

function otherThan(value: null | boolean | number | string): Json {
  if (typeof value === 'number') return value + 1;
  if (typeof value === 'boolean') return !value;
  if (value === null) return 'x';
  // One character within the alphabet the text is made of, so that hashes stay hashes and times stay times.
  const last = value.at(-1) === 'Z' ? value.length - 2 : value.length - 1;
  return `${value.slice(0, last)}${value[last] === '1' ? '2' : '1'}${value.slice(last + 1)}`;
}

/** JSON with sorted members, written apart from the code under test. */
function canonical(value: Json): string {
  return JSON.stringify(value, (_, each: Json) =>
    typeof each === 'object' && each !== null && !Array.isArray(each)
      ? Object.fromEntries(Object.entries(each).sort(([a], [b]) => (a < b ? -1 : 1)))
      : each,
  );
}

const withoutBody = (line: string): string => canonical({ ...(JSON.parse(line) as object), body: null });

/** Another entry in the place of one, sealed and chained to the one before as if it belonged there. */
function resealed(index: number): string {
  const after = index === 0 ? {} : { after: headAt(index) };
  return aSealedLog({ bodies: [{ kind: 'forged' }], sha256, ...after }).lines[0] ?? '';
}

const without = (bytes: Buffer, from: number, length: number): Buffer =>
  Buffer.concat([bytes.subarray(0, from), bytes.subarray(from + length)]);

function checkedBytes(bytes: Buffer, heads: readonly LogHead[]): LogVerdict {
  const check = new LogCheck({ sha256, heads });
  const parts: Buffer[] = [];
  let from = 0;
  for (let end = bytes.indexOf(10); end >= 0; end = bytes.indexOf(10, from)) {
    parts.push(bytes.subarray(from, end));
    from = end + 1;
  }
  const isCutShort = from < bytes.length;
  if (isCutShort) parts.push(bytes.subarray(from));
  for (const part of parts) {
    try {
      check.take(new TextDecoder('utf-8', { fatal: true, ignoreBOM: true }).decode(part));
    } catch {
      check.takeUnreadable({ reason: 'not-utf-8' });
    }
  }
  return check.end({ isCutShort });
}
