import { Injectable, Logger, type OnApplicationBootstrap } from '@nestjs/common';
import { Interval } from '@nestjs/schedule';
import { TimetableDays } from './timetable-days.service';

/** A day that begins is opened at most so long after midnight; it was the day after tomorrow until then. */
const everyMilliseconds = 2 * 60 * 1000;

/** Opens the next service day when one has begun. */
@Injectable()
export class TimetableDaysJob implements OnApplicationBootstrap {
  private readonly logger = new Logger(TimetableDaysJob.name);
  private isRolling = false;

  constructor(private readonly days: TimetableDays) {}

  async onApplicationBootstrap(): Promise<void> {
    await this.roll();
  }

  /** Takes its turn among all other work; a run that meets the one before it still going does nothing. */
  @Interval(everyMilliseconds)
  async roll(): Promise<void> {
    if (this.isRolling) return;
    this.isRolling = true;
    try {
      await this.days.roll();
    } catch (error) {
      this.logger.error(`opening service days: ${error instanceof Error ? error.stack : String(error)}`);
    } finally {
      this.isRolling = false;
    }
  }
}
