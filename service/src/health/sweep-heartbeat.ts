import { Injectable } from '@nestjs/common';
import { type Instant, sweepSilenceSeconds } from '@stubpost/shared';
import { Clock } from '../common/clock';

/** When the alert sweep last went through. Its silence is itself an alarm. */
@Injectable()
export class SweepHeartbeat {
  private readonly startedAt: Instant;
  private lastAt: Instant | null = null;

  constructor(private readonly clock: Clock) {
    this.startedAt = clock.now();
  }

  /** Called by the sweep each time it has gone through every turn. */
  beat(): void {
    this.lastAt = this.clock.now();
  }

  get lastSweepAt(): Instant | null {
    return this.lastAt;
  }

  /** Since when there was no sweep: the last one, or the start. */
  get silentSince(): Instant {
    return this.lastAt ?? this.startedAt;
  }

  /** Well for a while after a start, then only while sweeps keep coming. */
  isWell(): boolean {
    return this.clock.now() - this.silentSince <= sweepSilenceSeconds * 1000;
  }
}
