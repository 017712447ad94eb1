import { Injectable, Logger } from '@nestjs/common';
import { Interval } from '@nestjs/schedule';
import { Clock } from '../common/clock';
import { UnitOfWork } from '../database/unit-of-work';
import { ChangeHistory } from './change-history';

/** Name of the timer, by which it can be stopped. */
export const changePruningTimer = 'change-pruning';
const everyMilliseconds = 10 * 60 * 1000;

/** Drops changes that no stream will go on from any more. */
@Injectable()
export class ChangePruningJob {
  private readonly logger = new Logger(ChangePruningJob.name);

  constructor(
    private readonly history: ChangeHistory,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
  ) {}

  @Interval(changePruningTimer, everyMilliseconds)
  async tick(): Promise<void> {
    try {
      const now = this.clock.now();
      await this.unitOfWork.run((transaction) => this.history.prune(transaction, now));
    } catch (error) {
      this.logger.warn(`old changes stay for now: ${String(error)}`);
    }
  }
}
