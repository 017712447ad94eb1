import { Injectable } from '@nestjs/common';
import type { Transaction } from './unit-of-work';

/** Names of the running numbers that are kept. */
export type CounterName = 'entry' | 'change';

/**
 * Running numbers without gaps, taken in the same transaction as the row they number: a rollback gives the number
 * back, and the order of numbers is the order of commits on every engine.
 */
@Injectable()
export class Counters {
  async next(transaction: Transaction, name: CounterName): Promise<number> {
    const [row] = await transaction.query<{ value: number }[]>(
      `INSERT INTO counter (name, value) VALUES (?, 1)
       ON CONFLICT (name) DO UPDATE SET value = counter.value + 1 RETURNING value`,
      [name],
    );
    if (row === undefined) throw new Error(`the counter ${name} gave no number`);
    return Number(row.value);
  }
}
