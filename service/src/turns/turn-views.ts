import { Injectable } from '@nestjs/common';
import type { Instant } from '@stubpost/shared';
import { LatenessRules } from '../alerts/lateness-rules';
import type { TurnFile } from './turn-file';
import { lookOf, turnMomentOf } from './turn-moment';
import { wireTurnOf } from './turn.mapper';
import { isOver } from './watched-turn';

/** Figures that change with the clock are made anew this often at most, for all who ask. */
export const viewMilliseconds = 5000;

interface KeptView {
  /** Number of the stretch of 5 s in which it was last looked at. */
  stretch: number;
  look: string;
  json: string;
  /** Whether the clock changes nothing about it any more. */
  isFinal: boolean;
}

/**
 * Each turn made into text once for all who ask: anew when its file has changed, and when the clock has changed
 * something about it, which is looked at once in 5 s. Board, single route and live stream send the same text.
 */
@Injectable()
export class TurnViews {
  private readonly kept = new WeakMap<TurnFile, KeptView>();

  constructor(private readonly rules: LatenessRules) {}

  /** The answer of `GET /api/turns/:id`. The same text as before means that nothing has changed. */
  async jsonOf(file: TurnFile, now: Instant): Promise<string> {
    const stretch = Math.floor(now / viewMilliseconds);
    const known = this.kept.get(file);
    if (known !== undefined && (known.stretch === stretch || known.isFinal)) return known.json;
    const { lateness } = await this.rules.of(file.record.terminalCode, file.record.zone);
    const moment = turnMomentOf(file, lateness, now);
    const look = lookOf(moment);
    const json = known?.look === look ? known.json : JSON.stringify(wireTurnOf(file, moment, lateness));
    const isFinal = file.record.settledAt !== null && isOver(file.facts, now);
    this.kept.set(file, { stretch, look, json, isFinal });
    return json;
  }
}
