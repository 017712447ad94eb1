import { Injectable, Logger, type OnModuleDestroy, type OnModuleInit } from '@nestjs/common';
import { Config } from '../config/config';
import { databaseFile } from './database-file';
import { walBytes } from './data-sources';
import { UnitOfWork } from './unit-of-work';

const everyMilliseconds = 5 * 60 * 1000;
const worryBytes = 64 * 1024 * 1024;

/** Folds the write-ahead log into the database now and then, so that it does not grow behind long readers. */
@Injectable()
export class WalCheckpoint implements OnModuleInit, OnModuleDestroy {
  private readonly logger = new Logger(WalCheckpoint.name);
  private timer: NodeJS.Timeout | undefined;

  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly config: Config,
  ) {}

  onModuleInit(): void {
    this.timer = setInterval(() => void this.fold(), everyMilliseconds);
    this.timer.unref();
  }

  onModuleDestroy(): void {
    clearInterval(this.timer);
  }

  async fold(): Promise<void> {
    try {
      await this.unitOfWork.between((writer) => writer.query('PRAGMA wal_checkpoint(TRUNCATE)'));
      const bytes = walBytes(databaseFile(this.config.dataDir));
      if (bytes > worryBytes) this.logger.error(`the write-ahead log has ${bytes} bytes and does not shrink`);
    } catch (error) {
      this.logger.warn(`checkpoint put off: ${String(error)}`);
    }
  }
}
