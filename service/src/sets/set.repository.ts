import { Injectable } from '@nestjs/common';
import {
  type PutSetRequest,
  type UnitKind,
  type WireSet,
  type WireUnit,
  formatInstant,
} from '@stubpost/shared';
import { Reader } from '../database/reader';
import type { Transaction } from '../database/unit-of-work';

interface RawSet {
  id: string;
  version: number;
  label: string;
  leading_unit: string | null;
  off_air_since: number | string | null;
}

interface RawUnit {
  set_id: string;
  number: string;
  kind: string;
  length_feet: number | null;
  tons: number | null;
  handbrake_pounds: number | null;
}

const unitsSql = `SELECT su.set_id, u.number, u.kind, u.length_feet, u.tons, u.handbrake_pounds
  FROM set_unit su JOIN unit u ON u.id = su.unit_id`;

interface CarRow {
  label: string;
  number: string;
}

const carsSql = (labels: number): string => `SELECT s.label, u.number FROM equipment_set s
  JOIN set_unit su ON su.set_id = s.id JOIN unit u ON u.id = su.unit_id
  WHERE s.label IN (${Array.from({ length: labels }, () => '?').join(', ')}) AND u.kind <> 'locomotive'
  ORDER BY s.label, su.position`;

const unitOf = (raw: RawUnit): WireUnit => ({
  number: raw.number,
  kind: raw.kind as UnitKind,
  lengthFeet: raw.length_feet,
  tons: raw.tons,
  handbrakePounds: raw.handbrake_pounds,
});

const setOf = (raw: RawSet, units: RawUnit[]): WireSet => ({
  id: raw.id,
  version: raw.version,
  label: raw.label,
  units: units.map(unitOf),
  leadingUnit: raw.leading_unit,
  offAirSince: raw.off_air_since === null ? null : formatInstant(Number(raw.off_air_since)),
});

/** Rows of equipment sets and units. */
@Injectable()
export class SetRepository {
  constructor(private readonly reader: Reader) {}

  async findAll(): Promise<WireSet[]> {
    const sets = await this.reader.query<RawSet>('SELECT * FROM equipment_set ORDER BY label');
    const units = await this.reader.query<RawUnit>(`${unitsSql} ORDER BY su.set_id, su.position`);
    const bySet = new Map<string, RawUnit[]>(sets.map((set) => [set.id, []]));
    for (const unit of units) bySet.get(unit.set_id)?.push(unit);
    return sets.map((set) => setOf(set, bySet.get(set.id) ?? []));
  }

  async findByLabel(transaction: Transaction, label: string): Promise<WireSet | null> {
    const [set] = await transaction.query<RawSet[]>('SELECT * FROM equipment_set WHERE label = ?', [label]);
    if (set === undefined) return null;
    const units = await transaction.query<RawUnit[]>(`${unitsSql} WHERE su.set_id = ? ORDER BY su.position`, [
      set.id,
    ]);
    return setOf(set, units);
  }

  async findCarsIn(transaction: Transaction, label: string): Promise<string[]> {
    const rows = await transaction.query<CarRow[]>(carsSql(1), [label]);
    return rows.map((row) => row.number);
  }

  async findCarsOf(labels: readonly string[]): Promise<Map<string, string[]>> {
    const bySet = new Map<string, string[]>(labels.map((label) => [label, []]));
    if (labels.length === 0) return bySet;
    for (const row of await this.reader.query<CarRow>(carsSql(labels.length), [...labels])) {
      bySet.get(row.label)?.push(row.number);
    }
    return bySet;
  }

  async insert(
    transaction: Transaction,
    set: { id: string; label: string; createdAt: number },
  ): Promise<void> {
    await transaction.execute(
      `INSERT INTO equipment_set (id, version, label, leading_unit, off_air_since, created_at)
       VALUES (?, 0, ?, NULL, NULL, ?)`,
      [set.id, set.label, set.createdAt],
    );
  }

  /** Counts the set's version up from the one that was seen; false when somebody was faster. */
  async update(
    transaction: Transaction,
    change: { id: string; version: number; leadingUnit: string | null },
  ): Promise<boolean> {
    const changed = await transaction.execute(
      'UPDATE equipment_set SET version = version + 1, leading_unit = ? WHERE id = ? AND version = ?',
      [change.leadingUnit, change.id, change.version],
    );
    return changed === 1;
  }

  /** Puts units into a set in their order. A unit that stood in another set leaves it. */
  async putUnits(
    transaction: Transaction,
    setId: string,
    units: readonly { id: string; unit: PutSetRequest['units'][number] }[],
    now: number,
  ): Promise<void> {
    await transaction.execute('DELETE FROM set_unit WHERE set_id = ?', [setId]);
    for (const [position, { id, unit }] of units.entries()) {
      const [row] = await transaction.query<{ id: string }[]>(
        `INSERT INTO unit (id, number, kind, length_feet, tons, handbrake_pounds, created_at) VALUES (?, ?, ?, ?, ?, ?, ?)
         ON CONFLICT (number) DO UPDATE SET kind = excluded.kind, length_feet = excluded.length_feet,
         tons = excluded.tons, handbrake_pounds = excluded.handbrake_pounds RETURNING id`,
        [
          id,
          unit.number,
          unit.kind,
          unit.lengthFeet ?? null,
          unit.tons ?? null,
          unit.handbrakePounds ?? null,
          now,
        ],
      );
      if (row === undefined) throw new Error(`unit ${unit.number} was not kept`);
      await transaction.execute('DELETE FROM set_unit WHERE unit_id = ?', [row.id]);
      await transaction.execute('INSERT INTO set_unit (set_id, position, unit_id) VALUES (?, ?, ?)', [
        setId,
        position,
        row.id,
      ]);
    }
  }

  /** Labels of the sets in which units with these numbers stand. */
  async findLabelsOf(transaction: Transaction, numbers: readonly string[]): Promise<string[]> {
    if (numbers.length === 0) return [];
    const rows = await transaction.query<{ label: string }[]>(
      `SELECT DISTINCT s.label FROM unit u JOIN set_unit su ON su.unit_id = u.id
       JOIN equipment_set s ON s.id = su.set_id WHERE u.number IN (${numbers.map(() => '?').join(', ')})`,
      [...numbers],
    );
    return rows.map((row) => row.label);
  }
}
