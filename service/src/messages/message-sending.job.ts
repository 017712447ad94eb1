import { Injectable, Logger, type OnApplicationBootstrap, type OnModuleDestroy } from '@nestjs/common';
import { Interval } from '@nestjs/schedule';
import type { Subscription } from 'rxjs';
import { Clock } from '../common/clock';
import { MessageSender } from './message-sender';
import { Outbox } from './outbox';

/** Name of the timer, by which it can be stopped. */
export const messageSendingTimer = 'message-sending';
/** What waits for another try is looked for this often; something new is sent at once. */
const everyMilliseconds = 2000;

/** Takes the time and has the outbox sent, one run after the other. */
@Injectable()
export class MessageSendingJob implements OnApplicationBootstrap, OnModuleDestroy {
  private readonly logger = new Logger(MessageSendingJob.name);
  private isStopping = false;
  private last: Promise<void> = Promise.resolve();
  private subscription: Subscription | undefined;

  constructor(
    private readonly sender: MessageSender,
    private readonly outbox: Outbox,
    private readonly clock: Clock,
  ) {}

  onApplicationBootstrap(): void {
    this.subscription = this.outbox.rings.subscribe(() => void this.tick());
  }

  /** A run under way is over before the database closes. */
  async onModuleDestroy(): Promise<void> {
    this.isStopping = true;
    this.subscription?.unsubscribe();
    this.sender.stop();
    await this.last;
  }

  @Interval(messageSendingTimer, everyMilliseconds)
  tick(): Promise<void> {
    this.last = this.last.then(() => (this.isStopping ? undefined : this.run()));
    return this.last;
  }

  private async run(): Promise<void> {
    try {
      await this.sender.run(this.clock.now());
    } catch (error) {
      this.logger.error(`sending failed: ${error instanceof Error ? error.stack : String(error)}`);
    }
  }
}
