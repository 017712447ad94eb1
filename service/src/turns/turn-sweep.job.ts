import { Injectable, Logger, type OnApplicationBootstrap, type OnModuleDestroy } from '@nestjs/common';
import { Interval } from '@nestjs/schedule';
import { Clock } from '../common/clock';
import { SweepHeartbeat } from '../health/sweep-heartbeat';
import { TurnSweep } from './turn-sweep.service';

/** Name of the timer, by which it can be stopped. */
export const turnSweepTimer = 'turn-sweep';
/** The sweep runs this often. */
export const turnSweepMilliseconds = 5000;

/** Takes the time and has the sweep run; its heartbeat is what health goes by. */
@Injectable()
export class TurnSweepJob implements OnApplicationBootstrap, OnModuleDestroy {
  private readonly logger = new Logger(TurnSweepJob.name);
  private isStopping = false;
  private last: Promise<void> = Promise.resolve();

  constructor(
    private readonly sweep: TurnSweep,
    private readonly clock: Clock,
    private readonly heartbeat: SweepHeartbeat,
  ) {}

  onApplicationBootstrap(): void {
    void this.tick();
  }

  /** A run under way is over before the database closes. */
  async onModuleDestroy(): Promise<void> {
    this.isStopping = true;
    await this.last;
  }

  @Interval(turnSweepTimer, turnSweepMilliseconds)
  tick(): Promise<void> {
    if (!this.isStopping) this.last = this.run();
    return this.last;
  }

  private async run(): Promise<void> {
    try {
      await this.sweep.sweep(this.clock.now());
      this.heartbeat.beat();
    } catch (error) {
      this.logger.error(`the sweep failed: ${error instanceof Error ? error.stack : String(error)}`);
    }
  }
}
