import { Injectable } from '@nestjs/common';
import type { CalendarDate, Instant, PlanStep, StepPlan } from '@stubpost/shared';
import { Reader } from '../database/reader';
import type { Transaction } from '../database/unit-of-work';

/** A plan version with where it belongs and who made it. */
export interface StoredPlan extends StepPlan {
  terminalCode: string;
  createdAt: Instant;
  createdBy: string | null;
}

interface RawPlan {
  id: string;
  terminal_code: string;
  key: string;
  name: string;
  version: number;
  effective_from: string;
  steps: string;
  created_at: number | string;
  created_by: string | null;
}

const planOf = (raw: RawPlan): StoredPlan => ({
  id: raw.id,
  terminalCode: raw.terminal_code,
  key: raw.key,
  name: raw.name,
  version: raw.version,
  effectiveFrom: raw.effective_from,
  steps: JSON.parse(raw.steps) as PlanStep[],
  createdAt: Number(raw.created_at),
  createdBy: raw.created_by,
});

/** Newest first: what takes effect later stands above, and of two from one day the one made later. */
const newestFirst = 'ORDER BY effective_from DESC, created_at DESC, version DESC, id';

/** Rows of step plans, appended and never changed. */
@Injectable()
export class PlanRepository {
  constructor(private readonly reader: Reader) {}

  async findById(id: string): Promise<StoredPlan | null> {
    const [row] = await this.reader.query<RawPlan>('SELECT * FROM step_plan WHERE id = ?', [id]);
    return row === undefined ? null : planOf(row);
  }

  async findByIdIn(transaction: Transaction, id: string): Promise<StoredPlan | null> {
    const [row] = await transaction.query<RawPlan[]>('SELECT * FROM step_plan WHERE id = ?', [id]);
    return row === undefined ? null : planOf(row);
  }

  async findAllAt(terminalCode: string): Promise<StoredPlan[]> {
    const rows = await this.reader.query<RawPlan>(
      `SELECT * FROM step_plan WHERE terminal_code = ? ${newestFirst}`,
      [terminalCode],
    );
    return rows.map(planOf);
  }

  async findInForce(
    transaction: Transaction,
    terminalCode: string,
    serviceDate: CalendarDate,
  ): Promise<StoredPlan | null> {
    const [row] = await transaction.query<RawPlan[]>(
      `SELECT * FROM step_plan WHERE terminal_code = ? AND effective_from <= ? ${newestFirst} LIMIT 1`,
      [terminalCode, serviceDate],
    );
    return row === undefined ? null : planOf(row);
  }

  async lastVersion(transaction: Transaction, terminalCode: string, key: string): Promise<number> {
    const [row] = await transaction.query<{ version: number | null }[]>(
      'SELECT max(version) AS version FROM step_plan WHERE terminal_code = ? AND key = ?',
      [terminalCode, key],
    );
    return row?.version ?? 0;
  }

  async insert(transaction: Transaction, plan: StoredPlan): Promise<void> {
    await transaction.execute(
      `INSERT INTO step_plan (id, terminal_code, key, name, version, effective_from, steps, created_at, created_by)
       VALUES (?, ?, ?, ?, ?, ?, ?, ?, ?)`,
      [
        plan.id,
        plan.terminalCode,
        plan.key,
        plan.name,
        plan.version,
        plan.effectiveFrom,
        JSON.stringify(plan.steps),
        plan.createdAt,
        plan.createdBy,
      ],
    );
  }
}
