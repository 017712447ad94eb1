import { existsSync } from 'node:fs';
import { Injectable } from '@nestjs/common';
import { Config } from '../config/config';
import { pointerFile } from './database-file';
import { Reader } from './reader';
import { INSTALLATION, Settings } from './settings';
import type { Transaction } from './unit-of-work';

const DEMO = 'demo';

/** What kind of database this is: a demo with invented people, or a railroad's own. */
@Injectable()
export class Installation {
  constructor(
    private readonly config: Config,
    private readonly reader: Reader,
    private readonly settings: Settings,
  ) {}

  /** Whether this database was filled with invented people. Stays so for good. */
  async isDemo(): Promise<boolean> {
    return (await this.settings.find(INSTALLATION, DEMO)) !== null;
  }

  /**
   * Whether the demo is to be filled and played: it was not switched off or left, and the database is a demo already
   * or holds nothing yet.
   */
  async isDemoWanted(): Promise<boolean> {
    if (this.config.demo === 'off' || existsSync(pointerFile(this.config.dataDir))) return false;
    return (await this.isDemo()) || (await this.isEmpty());
  }

  /** Marks a database as a demo, before its first invented person is added. */
  async markAsDemo(transaction: Transaction): Promise<void> {
    await this.settings.put(transaction, { scope: INSTALLATION, name: DEMO, value: true, changedBy: null });
  }

  private async isEmpty(): Promise<boolean> {
    const rows = await this.reader.query('SELECT id FROM person UNION ALL SELECT id FROM terminal LIMIT 1');
    return rows.length === 0;
  }
}
