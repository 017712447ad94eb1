import { Injectable } from '@nestjs/common';
import {
  type FindQuery,
  type FoundTurn,
  type Instant,
  formatClock,
  formatInstant,
  formatServiceDate,
  millisecondsInHour,
} from '@stubpost/shared';
import { Reader } from '../database/reader';
import { TerminalsReadModel } from '../terminals/terminals.read-model';
import type { CrewMemberOfTurn } from './turn.entity';

/** Looked through are turns from a day back to two days ahead: what is opened, and yesterday. Our choice. */
const backMilliseconds = 24 * millisecondsInHour;
const aheadMilliseconds = 48 * millisecondsInHour;
const mostFound = 20;

interface FindableRow {
  id: string;
  service_date: string;
  zone: string;
  inbound_train: string | null;
  outbound_train: string | null;
  track: string | null;
  set_label: string | null;
  crew: string;
  span_from: number | string;
}

/** What a turn can be found by, in the order in which finds are shown. */
type Matched = FoundTurn['matched'];

interface Find {
  row: FindableRow;
  matched: Matched;
  /** The text in which the word was found. */
  text: string;
  /** 0 for the whole text, 1 for its beginning, 2 for a part. */
  grade: number;
}

const order: readonly Matched[] = ['train', 'set', 'car', 'person', 'track'];

/** Finds turns of a terminal by part of a train number, a set, a car, a person's name or a track. */
@Injectable()
export class TurnFinder {
  constructor(
    private readonly reader: Reader,
    private readonly terminals: TerminalsReadModel,
  ) {}

  /** The best finds: whole words before beginnings before parts, then trains before sets and so on, then the nearest in time. */
  async find({ terminal, q }: FindQuery, now: Instant): Promise<FoundTurn[]> {
    await this.terminals.require(terminal);
    const word = q.toLowerCase();
    const rows = await this.reader.query<FindableRow>(
      `SELECT id, service_date, zone, inbound_train, outbound_train, track, set_label, crew, span_from FROM turn
       WHERE terminal_code = ? AND withdrawn_at IS NULL AND span_to >= ? AND span_from < ?`,
      [terminal, now - backMilliseconds, now + aheadMilliseconds],
    );
    const cars = await this.carsLike(word);
    const distance = (row: FindableRow): number => Math.abs(Number(row.span_from) - now);
    return rows
      .flatMap((row) => bestFind(row, word, cars) ?? [])
      .sort(
        (a, b) =>
          a.grade - b.grade ||
          order.indexOf(a.matched) - order.indexOf(b.matched) ||
          distance(a.row) - distance(b.row),
      )
      .slice(0, mostFound)
      .map((find) => foundTurnOf(terminal, find));
  }

  /** Units whose number holds the word, by the label of their set. */
  private async carsLike(word: string): Promise<Map<string, string[]>> {
    const rows = await this.reader.query<{ label: string; number: string }>(
      `SELECT s.label, u.number FROM unit u JOIN set_unit su ON su.unit_id = u.id
       JOIN equipment_set s ON s.id = su.set_id ORDER BY s.label, su.position`,
    );
    const bySet = new Map<string, string[]>();
    for (const { label, number } of rows) {
      if (number.toLowerCase().includes(word)) bySet.set(label, [...(bySet.get(label) ?? []), number]);
    }
    return bySet;
  }
}

function bestFind(row: FindableRow, word: string, cars: ReadonlyMap<string, string[]>): Find | null {
  const crew = row.crew === '[]' ? [] : (JSON.parse(row.crew) as CrewMemberOfTurn[]);
  const texts: [Matched, string | null][] = [
    ['train', row.outbound_train],
    ['train', row.inbound_train],
    ['set', row.set_label],
    ...(cars.get(row.set_label ?? '') ?? []).map((car): [Matched, string] => ['car', car]),
    ...crew.map((member): [Matched, string] => ['person', member.name]),
    ['track', row.track],
  ];
  let best: Find | null = null;
  for (const [matched, text] of texts) {
    const grade = text === null ? null : gradeOf(text.toLowerCase(), word);
    if (text === null || grade === null || (best !== null && best.grade <= grade)) continue;
    best = { row, matched, text, grade };
  }
  return best;
}

function gradeOf(text: string, word: string): number | null {
  if (text === word) return 0;
  if (text.startsWith(word) || text.includes(` ${word}`)) return 1;
  return text.includes(word) ? 2 : null;
}

function foundTurnOf(terminal: string, { row, matched, text }: Find): FoundTurn {
  const at = Number(row.span_from);
  const trains = [row.inbound_train, row.outbound_train].filter((train) => train !== null).join(' → ');
  const place = row.track === null ? '' : `, track ${row.track}`;
  const because = matched === 'train' || matched === 'track' ? '' : `, ${matched} ${text}`;
  const when = `${formatClock(at, row.zone)}, ${formatServiceDate(row.service_date)}`;
  return {
    turnId: row.id,
    terminal,
    serviceDate: row.service_date,
    text: `${trains}${place}${because}, ${when}`,
    matched,
    at: formatInstant(at),
  };
}
