import { Injectable, Logger, type OnApplicationBootstrap, type OnModuleDestroy } from '@nestjs/common';
import { Interval } from '@nestjs/schedule';
import { Clock } from '../common/clock';
import { ChainCheck } from './chain-check.service';
import { DailyHeads } from './daily-heads.service';

/** New entries are checked, and heads that are due published, this often. */
const everyMilliseconds = 60_000;
/** The whole log is checked anew this often, and at each start. Our choice. */
const checkAllEveryMilliseconds = 60 * 60_000;

/** Takes the time and has the daily heads published and the chain checked. */
@Injectable()
export class RecordsJob implements OnApplicationBootstrap, OnModuleDestroy {
  private readonly logger = new Logger(RecordsJob.name);
  private isStopping = false;
  private publishing: Promise<void> = Promise.resolve();

  constructor(
    private readonly heads: DailyHeads,
    private readonly chain: ChainCheck,
    private readonly clock: Clock,
  ) {}

  onApplicationBootstrap(): void {
    void this.publish();
    void this.checkAll();
  }

  /** What is under way is over before the database closes. */
  async onModuleDestroy(): Promise<void> {
    this.isStopping = true;
    await this.publishing;
    await this.chain.stop();
  }

  @Interval(everyMilliseconds)
  publish(): Promise<void> {
    // One after the other: a slow one must not be overtaken by the next.
    if (!this.isStopping) this.publishing = this.publishing.then(() => this.publishNow());
    return this.publishing;
  }

  @Interval(everyMilliseconds)
  follow(): Promise<void> {
    return this.check(() => this.chain.follow());
  }

  @Interval(checkAllEveryMilliseconds)
  checkAll(): Promise<void> {
    return this.check(() => this.chain.run());
  }

  private async check(work: () => Promise<unknown>): Promise<void> {
    try {
      if (!this.isStopping) await work();
    } catch (error) {
      this.logger.error(`the log could not be checked: ${stackOf(error)}`);
    }
  }

  private async publishNow(): Promise<void> {
    try {
      await this.heads.publish(this.clock.now());
    } catch (error) {
      this.logger.error(`the daily heads could not be published: ${stackOf(error)}`);
    }
  }
}

const stackOf = (error: unknown): string =>
  error instanceof Error ? (error.stack ?? error.message) : String(error);
