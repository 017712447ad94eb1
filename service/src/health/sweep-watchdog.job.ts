import { Injectable, type OnModuleDestroy } from '@nestjs/common';
import { Interval } from '@nestjs/schedule';
import { SweepWatchdog } from './sweep-watchdog';

/** Often enough that nobody waits long beyond the silence that counts. */
const everyMilliseconds = 10_000;

/** Has the watchdog look, one look after the other. */
@Injectable()
export class SweepWatchdogJob implements OnModuleDestroy {
  private looking: Promise<void> | undefined;
  private isStopping = false;

  constructor(private readonly watchdog: SweepWatchdog) {}

  /** A message under way is over before the ways out close. */
  async onModuleDestroy(): Promise<void> {
    this.isStopping = true;
    await this.looking;
  }

  @Interval('sweep-watchdog', everyMilliseconds)
  tick(): void {
    if (this.isStopping) return;
    this.looking ??= this.watchdog.look().finally(() => {
      this.looking = undefined;
    });
  }
}
