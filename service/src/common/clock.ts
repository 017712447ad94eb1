import { Injectable } from '@nestjs/common';
import type { Instant } from '@stubpost/shared';

/** The only way to learn what time it is. Tests and the day player of the demo put another one in its place. */
export abstract class Clock {
  abstract now(): Instant;
}

/** The machine's own clock. */
@Injectable()
export class SystemClock extends Clock {
  override now(): Instant {
    return Date.now();
  }
}

/** A clock that stands until it is moved. */
export class FixedClock extends Clock {
  constructor(private instant: Instant) {
    super();
  }

  override now(): Instant {
    return this.instant;
  }

  set(instant: Instant): void {
    this.instant = instant;
  }

  advance(seconds: number): void {
    this.instant += seconds * 1000;
  }
}
