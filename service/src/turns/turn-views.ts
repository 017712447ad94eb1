import { Injectable } from '@nestjs/common';
import type { Instant, WireTurn } from '@stubpost/shared';
import { LatenessRules } from '../alerts/lateness-rules';
import type { TurnFile } from './turn-file';
import { wireTurnOf } from './turn.mapper';

/** Figures that change with the clock are made anew this often at most, for all who ask. */
export const viewMilliseconds = 5000;

interface KeptView {
  /** Number of the stretch of 5 s in which it was last looked at. */
  stretch: number;
  json: string;
}

/**
 * Each turn made into text once for all who ask: anew when its file has changed, and, while the clock changes
 * something about it, once in 5 s. Board, single route and live stream send the same text.
 */
@Injectable()
export class TurnViews {
  private readonly kept = new WeakMap<TurnFile, KeptView>();

  constructor(private readonly rules: LatenessRules) {}

  /** A turn as the routes give it, at this very moment. */
  async wireOf(file: TurnFile, now: Instant): Promise<WireTurn> {
    const { lateness } = await this.rules.of(file.record.terminalCode, file.record.zone);
    return wireTurnOf(file, lateness, now);
  }

  /** The answer of `GET /api/turns/:id`. The same text as before means that nothing has changed. */
  async jsonOf(file: TurnFile, now: Instant): Promise<string> {
    const stretch = Math.floor(now / viewMilliseconds);
    const known = this.kept.get(file);
    if (known !== undefined && (known.stretch === stretch || file.record.settledAt !== null)) return known.json;
    const { computedAt, ...content } = await this.wireOf(file, now);
    const open = JSON.stringify(content).slice(0, -1);
    const isSame = known?.json.startsWith(`${open},"computedAt":`) ?? false;
    const json = isSame && known !== undefined ? known.json : `${open},"computedAt":"${computedAt}"}`;
    this.kept.set(file, { stretch, json });
    return json;
  }
}
