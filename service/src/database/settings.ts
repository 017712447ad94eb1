import { Injectable } from '@nestjs/common';
import { Clock } from '../common/clock';
import { Reader } from './reader';
import type { Transaction } from './unit-of-work';

/** Scope of values that belong to the installation and no terminal. */
export const INSTALLATION = '*';

/** A value with who changed it, and when. */
export interface Setting<Value> {
  value: Value;
  version: number;
  changedBy: string | null;
  changedAt: number;
}

/** What is to be kept under which name. */
export interface SettingChange {
  scope: string;
  name: string;
  value: unknown;
  changedBy: string | null;
}

/** Named values as JSON: few, small, read by name. */
@Injectable()
export class Settings {
  constructor(
    private readonly reader: Reader,
    private readonly clock: Clock,
  ) {}

  async find<Value>(scope: string, name: string): Promise<Setting<Value> | null> {
    const [row] = await this.reader.query<{
      value: string;
      version: number;
      changed_by: string | null;
      changed_at: number;
    }>('SELECT value, version, changed_by, changed_at FROM setting WHERE scope = ? AND name = ?', [
      scope,
      name,
    ]);
    if (row === undefined) return null;
    return {
      value: JSON.parse(row.value) as Value,
      version: row.version,
      changedBy: row.changed_by,
      changedAt: Number(row.changed_at),
    };
  }

  async put(transaction: Transaction, change: SettingChange): Promise<void> {
    await transaction.execute(
      `INSERT INTO setting (scope, name, value, version, changed_by, changed_at) VALUES (?, ?, ?, 1, ?, ?)
       ON CONFLICT (scope, name) DO UPDATE SET value = excluded.value, version = setting.version + 1,
       changed_by = excluded.changed_by, changed_at = excluded.changed_at`,
      [change.scope, change.name, JSON.stringify(change.value), change.changedBy, this.clock.now()],
    );
  }
}
