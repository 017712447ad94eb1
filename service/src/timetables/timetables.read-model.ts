import { Injectable } from '@nestjs/common';
import {
  activationOn,
  calendarDateAt,
  formatInstant,
  spanOfActivation,
  type CalendarDate,
  type ImportProblem,
  type TerminalChoice,
  type TimetableState,
  type TimetableSummary,
  type WireTimetable,
  type WireTimetableHead,
} from '@stubpost/shared';
import { Clock } from '../common/clock';
import { Refusal } from '../common/refusal';
import { Reader } from '../database/reader';
import { TimetableImports } from './timetable-imports.service';

/** An order as the pages need it. Orders taken back are not among them. */
export interface StandingOrder {
  number: number;
  timetableId: string;
  fileName: string;
  from: CalendarDate;
  acceptGuesses: boolean;
}

interface HeadRow {
  id: string;
  state: string;
  file_name: string;
  file_bytes: number;
  route_types: string;
  uploaded_by: string | null;
  read_at: number | null;
  summary: string | null;
  created_at: number;
}

const headColumns =
  'id, state, file_name, file_bytes, route_types, uploaded_by, read_at, summary, created_at';

/** Imported timetables as the pages show them. */
@Injectable()
export class TimetablesReadModel {
  constructor(
    private readonly reader: Reader,
    private readonly imports: TimetableImports,
    private readonly clock: Clock,
  ) {}

  /** All of them, the newest first. */
  async all(): Promise<WireTimetableHead[]> {
    const rows = await this.reader.query<HeadRow>(
      `SELECT ${headColumns} FROM timetable ORDER BY created_at DESC, id`,
    );
    const orders = await this.standingOrders();
    return rows.map((row) => this.headOf(row, orders));
  }

  async require(id: string): Promise<WireTimetable> {
    const [row] = await this.reader.query<HeadRow & { problems: string }>(
      `SELECT ${headColumns}, problems FROM timetable WHERE id = ?`,
      [id],
    );
    if (row === undefined) throw unknownTimetable();
    const orders = await this.standingOrders();
    const own = orders.filter((order) => order.timetableId === id).at(-1);
    const newest = orders.at(-1);
    const before =
      newest?.timetableId === id ? orders.findLast((order) => order.timetableId !== id) : undefined;
    return {
      ...this.headOf(row, orders),
      problems: JSON.parse(row.problems) as ImportProblem[],
      summary: summaryOf(row),
      terminals: own === undefined ? [] : await this.terminalsOf(own.number),
      acceptGuesses: own?.acceptGuesses ?? false,
      rollBackTo: before === undefined ? null : { id: before.timetableId, fileName: before.fileName },
    };
  }

  /** The timetable that runs on a date when one is left out of the question; null when none does. */
  async runningBeside(id: string, date: CalendarDate): Promise<StandingOrder | null> {
    const orders = await this.standingOrders();
    return activationOn(
      orders.filter((order) => order.timetableId !== id),
      date,
    );
  }

  async standingOrders(): Promise<StandingOrder[]> {
    const rows = await this.reader.query<{
      number: number;
      timetable_id: string;
      file_name: string;
      from_date: string;
      accept_guesses: number;
    }>(
      `SELECT a.number, a.timetable_id, t.file_name, a.from_date, a.accept_guesses
       FROM timetable_activation a JOIN timetable t ON t.id = a.timetable_id
       WHERE a.taken_back_at IS NULL ORDER BY a.number`,
    );
    return rows.map((row) => ({
      number: row.number,
      timetableId: row.timetable_id,
      fileName: row.file_name,
      from: row.from_date,
      acceptGuesses: row.accept_guesses === 1,
    }));
  }

  async terminalsOf(activationNumber: number): Promise<(TerminalChoice & { stationIds: string[] })[]> {
    const rows = await this.reader.query<{ code: string; name: string; station_ids: string }>(
      'SELECT code, name, station_ids FROM timetable_terminal WHERE activation_number = ? ORDER BY position',
      [activationNumber],
    );
    return rows.map(({ code, name, station_ids }) => ({
      code,
      name,
      stationIds: JSON.parse(station_ids) as string[],
    }));
  }

  private headOf(row: HeadRow, orders: readonly StandingOrder[]): WireTimetableHead {
    const summary = summaryOf(row);
    const own = orders.filter((order) => order.timetableId === row.id);
    const spans = own.map((order) => spanOfActivation(orders, order)).filter((span) => span !== null);
    const span = spans.at(-1) ?? null;
    return {
      id: row.id,
      state: this.stateOf(row, own.length > 0, span, summary?.zone ?? 'UTC'),
      fileName: row.file_name,
      fileBytes: row.file_bytes,
      routeTypes: row.route_types,
      uploadedAt: formatInstant(Number(row.created_at)),
      uploadedBy: row.uploaded_by,
      readAt: row.read_at === null ? null : formatInstant(Number(row.read_at)),
      progress: row.state === 'reading' ? this.imports.progressOf(row.id) : null,
      activeFrom: span?.from ?? null,
      activeUntil: span?.until ?? null,
      firstDate: summary?.firstDate ?? null,
      lastDate: summary?.lastDate ?? null,
    };
  }

  /** Active: it runs, or an order says that it will. Retired: it has run, or was ordered to, and others took over. */
  private stateOf(
    row: HeadRow,
    isOrdered: boolean,
    span: { until: CalendarDate | null } | null,
    zone: string,
  ): TimetableState {
    if (row.state !== 'ready') return row.state as TimetableState;
    if (!isOrdered) return 'ready';
    const today = calendarDateAt(this.clock.now(), zone);
    return span !== null && (span.until === null || span.until >= today) ? 'active' : 'retired';
  }
}

function summaryOf(row: HeadRow): TimetableSummary | null {
  return row.summary === null ? null : (JSON.parse(row.summary) as TimetableSummary);
}

/** The refusal for an id that no timetable has. */
export function unknownTimetable(): Refusal {
  return new Refusal({ code: 'timetable.unknown', message: 'there is no such timetable' });
}
