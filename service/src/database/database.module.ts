import { type DynamicModule, Global, Inject, Module, type OnApplicationShutdown } from '@nestjs/common';
import type { DataSource } from 'typeorm';
import { Config } from '../config/config';
import { ChangeFeed, ChangeLog } from './change-log';
import { Counters } from './counters';
import { databaseFile } from './database-file';
import { type EntityClass, openReader, openWriter } from './data-sources';
import { Installation } from './installation';
import { Reader } from './reader';
import { Settings } from './settings';
import { READER, WRITER } from './tokens';
import { UnitOfWork } from './unit-of-work';
import { WalCheckpoint } from './wal-checkpoint';

/** The two connections on one SQLite file, and what may be done with them. */
@Global()
@Module({})
export class DatabaseModule implements OnApplicationShutdown {
  constructor(
    @Inject(WRITER) private readonly writer: DataSource,
    @Inject(READER) private readonly reader: DataSource,
    private readonly unitOfWork: UnitOfWork,
  ) {}

  static withEntities(entities: EntityClass[]): DynamicModule {
    const services = [UnitOfWork, Reader, Counters, ChangeLog, ChangeFeed, Settings, Installation];
    return {
      module: DatabaseModule,
      providers: [
        {
          provide: WRITER,
          inject: [Config],
          useFactory: (config: Config) => openWriter({ file: databaseFile(config.dataDir), entities }),
        },
        {
          provide: READER,
          // The file must be there and in WAL mode before it can be opened for reading only.
          inject: [Config, WRITER],
          useFactory: (config: Config) => openReader({ file: databaseFile(config.dataDir), entities }),
        },
        WalCheckpoint,
        ...services,
      ],
      exports: services,
    };
  }

  async onApplicationShutdown(): Promise<void> {
    await this.unitOfWork.drain();
    if (this.reader.isInitialized) await this.reader.destroy();
    if (this.writer.isInitialized) await this.writer.destroy();
  }
}
