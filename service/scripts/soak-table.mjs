import { formatDuration } from './say.mjs';

const HEADS = ['part', 'rounds', 'with receipt', 'lost', 'doubled', 'chain', 'took', 'result'];
const count = (value) => value.toLocaleString('en-US');

/** Figures of the same part added up: tests leave some after each of their rounds. */
export function mergeFigures(lines) {
  const parts = new Map();
  for (const line of lines) {
    const known = parts.get(line.part);
    parts.set(line.part, known === undefined ? line : sumOf(known, line));
  }
  return [...parts.values()];
}

const sumOf = (one, other) => ({
  part: one.part,
  rounds: one.rounds + other.rounds,
  acknowledged: one.acknowledged + other.acknowledged,
  lost: one.lost + other.lost,
  doubled: one.doubled + other.doubled,
  chain: one.chain === 'broken' ? one.chain : other.chain,
});

/**
 * What a part has come to: the figures its tests have left, whether their runner ended well, and how long it took. A
 * part that left no figures shows how many rounds it was asked for; its tests are the judge.
 */
export function rowsOf({ name, rounds, code, milliseconds, figures }) {
  const result = code === 0 ? 'held' : 'FAILED';
  const took = formatDuration(milliseconds);
  if (figures.length === 0) return [[name, count(rounds), '-', '-', '-', '-', took, result]];
  return figures.map((each, index) => [
    each.part,
    count(each.rounds),
    count(each.acknowledged),
    count(each.lost),
    count(each.doubled),
    each.chain,
    index === 0 ? took : '',
    isBad(each) ? 'FAILED' : result,
  ]);
}

const isBad = ({ lost, doubled, chain }) => lost > 0 || doubled > 0 || chain === 'broken';

/** Whether everything held: every runner ended well and no figures say otherwise. */
export const hasHeld = (parts) => parts.every(({ code, figures }) => code === 0 && !figures.some(isBad));

/** The rows under their heads, in columns; figures stand to the right. */
export function formatTable(rows) {
  const lines = [HEADS, ...rows];
  const widths = HEADS.map((_, column) => Math.max(...lines.map((line) => line[column].length)));
  const isFigure = (column) => column >= 1 && column <= 4;
  return lines
    .map((line) =>
      line
        .map((cell, column) =>
          isFigure(column) ? cell.padStart(widths[column]) : cell.padEnd(widths[column]),
        )
        .join('  ')
        .trimEnd(),
    )
    .join('\n');
}
