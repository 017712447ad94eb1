import { Injectable } from '@nestjs/common';
import { type Instant, addSeconds, firstOutHorizonSeconds, inboundHorizonSeconds } from '@stubpost/shared';
import { Reader } from '../database/reader';
import type { TurnVersion } from './turn-files';

const horizonSeconds = Math.max(firstOutHorizonSeconds, inboundHorizonSeconds);

/** Which turns the sweep has to look at. */
@Injectable()
export class SweepableTurns {
  constructor(private readonly reader: Reader) {}

  /** Turns in view on which the passing of time can still change something. */
  findOpen(now: Instant): Promise<TurnVersion[]> {
    return this.reader.query<TurnVersion>(
      `SELECT id, version FROM turn
       WHERE settled_at IS NULL AND withdrawn_at IS NULL AND span_from <= ? ORDER BY span_from, id`,
      [addSeconds(now, horizonSeconds)],
    );
  }

  /** Turns that were taken back while something stood on them or a hold time ran. */
  async findLeftBehind(): Promise<string[]> {
    const rows = await this.reader.query<{ id: string }>(
      `SELECT t.id FROM turn t WHERE t.withdrawn_at IS NOT NULL AND (
         EXISTS (SELECT 1 FROM alert_watch w WHERE w.subject_id = t.id)
         OR EXISTS (SELECT 1 FROM alert a WHERE a.subject_id = t.id AND a.state IN ('raised', 'taken', 'set-aside')))`,
    );
    return rows.map((row) => row.id);
  }
}
