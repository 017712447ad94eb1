import { Inject, Injectable } from '@nestjs/common';
import type { DataSource, EntityManager } from 'typeorm';
import { READER } from './tokens';

/** Reads what is committed, on a connection that cannot write. */
@Injectable()
export class Reader {
  constructor(@Inject(READER) private readonly reader: DataSource) {}

  /** For finders on entities. */
  get manager(): EntityManager {
    return this.reader.manager;
  }

  /** Rows of one SELECT, as the columns are named in it. */
  query<Row>(sql: string, parameters: unknown[] = []): Promise<Row[]> {
    return this.reader.query<Row[]>(sql, parameters);
  }
}
