import { Injectable } from '@nestjs/common';
import type { Departure, Instant } from '@stubpost/shared';
import { Reader } from '../database/reader';

/** A departure with where it comes from. */
export interface KnownDeparture extends Departure {
  track: string | null;
  set: string | null;
  origin: 'recorded' | 'imported';
  turnId: string | null;
}

interface DepartureRecord {
  service_date: string;
  train: string;
  track: string | null;
  set_label: string | null;
  scheduled_departure_at: number;
  departure_at: number | null;
  annulled: number;
  turn_id: string | null;
}

/** Departures of a terminal, from recorded turns and from loaded tables; a recorded turn counts before a loaded row. */
@Injectable()
export class DeparturesReadModel {
  constructor(private readonly reader: Reader) {}

  /**
   * Departures of the service dates `from` to `to`, both included, in order of schedule. A turn belongs here once
   * its scheduled departure has passed, or it has left or been annulled.
   */
  async departuresOf(
    terminalCode: string,
    from: string,
    to: string,
    now: Instant,
  ): Promise<KnownDeparture[]> {
    const rows = await this.reader.query<DepartureRecord>(
      `SELECT service_date, outbound_train AS train, track, set_label, scheduled_departure_at, departure_at,
         CASE WHEN annulled_at IS NULL THEN 0 ELSE 1 END AS annulled, id AS turn_id
       FROM turn
       WHERE terminal_code = ? AND service_date >= ? AND service_date <= ? AND scheduled_departure_at IS NOT NULL
         AND withdrawn_at IS NULL
         AND (scheduled_departure_at <= ? OR departure_at IS NOT NULL OR annulled_at IS NOT NULL)
       UNION ALL
       SELECT p.service_date, p.train, p.track, p.set_label, p.scheduled_departure_at, p.actual_departure_at, p.annulled, NULL
       FROM past_departure p
       WHERE p.terminal_code = ? AND p.service_date >= ? AND p.service_date <= ?
         AND NOT EXISTS (SELECT 1 FROM turn t WHERE t.terminal_code = p.terminal_code
           AND t.service_date = p.service_date AND t.outbound_train = p.train AND t.withdrawn_at IS NULL)
       ORDER BY scheduled_departure_at, train`,
      [terminalCode, from, to, now, terminalCode, from, to],
    );
    return rows.map(toDeparture);
  }
}

function toDeparture(row: DepartureRecord): KnownDeparture {
  const annulled = row.annulled === 1;
  return {
    serviceDate: row.service_date,
    train: row.train,
    track: row.track,
    set: row.set_label,
    scheduledDepartureAt: Number(row.scheduled_departure_at),
    actualDepartureAt: row.departure_at === null || annulled ? null : Number(row.departure_at),
    annulled,
    origin: row.turn_id === null ? 'imported' : 'recorded',
    turnId: row.turn_id,
  };
}
