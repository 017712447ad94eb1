import { type BeforeApplicationShutdown, type DynamicModule, Global, Module } from '@nestjs/common';
import { TypeOrmModule } from '@nestjs/typeorm';
import { Config } from '../config/config';
import { ChangeFeed, ChangeLog } from './change-log';
import { Counters } from './counters';
import { databaseFile } from './database-file';
import { type EntityClass, openWriter, readerOptions, writerOptions } from './data-sources';
import { Installation } from './installation';
import { Reader } from './reader';
import { Settings } from './settings';
import { READER_NAME, WRITER, WRITER_NAME } from './tokens';
import { UnitOfWork } from './unit-of-work';
import { WalCheckpoint } from './wal-checkpoint';

/** A file that cannot be opened now cannot be opened in three seconds either. The module closes what is named. */
const once = { retryAttempts: 0 };

/** The two connections on one SQLite file, and what may be done with them. */
@Global()
@Module({})
export class DatabaseModule implements BeforeApplicationShutdown {
  constructor(private readonly unitOfWork: UnitOfWork) {}

  static withEntities(entities: EntityClass[]): DynamicModule {
    const services = [UnitOfWork, Reader, Counters, ChangeLog, ChangeFeed, Settings, Installation];
    const optionsOf = (config: Config) => ({ file: databaseFile(config.dataDir), entities });
    return {
      module: DatabaseModule,
      imports: [
        TypeOrmModule.forRootAsync({
          name: WRITER_NAME,
          inject: [Config],
          useFactory: (config: Config) => ({
            ...writerOptions(optionsOf(config)),
            ...once,
            name: WRITER_NAME,
          }),
          dataSourceFactory: (options) => openWriter({ file: String(options?.database), entities }),
        }),
        TypeOrmModule.forRootAsync({
          name: READER_NAME,
          // The file must be there and in WAL mode before it can be opened for reading only.
          inject: [Config, WRITER],
          useFactory: (config: Config) => ({
            ...readerOptions(optionsOf(config)),
            ...once,
            name: READER_NAME,
          }),
        }),
      ],
      providers: [WalCheckpoint, ...services],
      exports: services,
    };
  }

  /** The connections close after this: nothing that was queued may be left. */
  async beforeApplicationShutdown(): Promise<void> {
    await this.unitOfWork.drain();
  }
}
