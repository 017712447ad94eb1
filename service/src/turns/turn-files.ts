import { Injectable } from '@nestjs/common';
import { AlertReadModel, mostUrgentFirst } from '../alerts/alert.read-model';
import { AlertRepository } from '../alerts/alert.repository';
import { Reader } from '../database/reader';
import type { Transaction } from '../database/unit-of-work';
import { PlansService } from '../plans/plans.service';
import { EntryLog, type LoggedEntry } from '../records/entry-log';
import { SetsService } from '../sets/sets.service';
import type { EntryBody } from './entry-body';
import { entryFrom } from './entry-from-body';
import { type TurnFile, turnFileFrom } from './turn-file';
import { type RawTurn, type TurnRecord, turnRecordOf } from './turn-record';

/** More files than this are not kept in memory; the ones not used for longest go first. Our choice, some 50 MB. */
const filesKept = 2000;

/** Which version of a turn is wanted. */
export interface TurnVersion {
  id: string;
  version: number;
}

/**
 * Files of turns in memory, each valid for one version of its row. Whatever changes a turn counts its version up in
 * the same transaction, so a file at the row's version is never stale.
 */
@Injectable()
export class TurnFiles {
  private readonly files = new Map<string, TurnFile>();
  /** Files that an open transaction has made and not yet committed. */
  private readonly staged = new WeakMap<Transaction, Map<string, TurnFile>>();

  constructor(
    private readonly reader: Reader,
    private readonly log: EntryLog,
    private readonly plans: PlansService,
    private readonly sets: SetsService,
    private readonly alerts: AlertReadModel,
    private readonly alertRows: AlertRepository,
  ) {}

  /** The file of a turn as it is committed; null when there is no such turn or it was taken back. */
  async find(id: string): Promise<TurnFile | null> {
    const [row] = await this.reader.query<TurnVersion>(
      'SELECT id, version FROM turn WHERE id = ? AND withdrawn_at IS NULL',
      [id],
    );
    if (row === undefined) return null;
    return (await this.findAll([row])).get(id) ?? null;
  }

  /** The files of some turns at these versions or later ones. Only what is missing is read. */
  async findAll(wanted: readonly TurnVersion[]): Promise<Map<string, TurnFile>> {
    const found = new Map<string, TurnFile>();
    const missing: string[] = [];
    for (const { id, version } of wanted) {
      const file = this.files.get(id);
      if (file !== undefined && file.record.version >= version) found.set(id, file);
      else missing.push(id);
    }
    for (const file of await this.read(missing)) {
      this.keep(file);
      found.set(file.record.id, file);
    }
    return found;
  }

  /** The file of a turn as an open transaction sees it. */
  async open(transaction: Transaction, record: TurnRecord): Promise<TurnFile> {
    const known = this.staged.get(transaction)?.get(record.id) ?? this.files.get(record.id);
    if (known?.record.version === record.version) return known;
    const plan = await this.plans.get(transaction, record.planId);
    const entries = (await this.log.findAboutIn(transaction, record.id)).map(entryOf);
    const alerts = await this.alertRows.findStandingOn(transaction, record.id);
    const cars = record.set === null ? [] : await this.sets.carsOf(transaction, record.set);
    return turnFileFrom({ record, plan, entries, cars, alerts: alerts.sort(mostUrgentFirst) });
  }

  /** Takes over a file that a transaction has made; others see it once that is committed. */
  stage(transaction: Transaction, file: TurnFile): void {
    const staged = this.staged.get(transaction) ?? new Map<string, TurnFile>();
    this.staged.set(transaction, staged);
    staged.set(file.record.id, file);
    transaction.afterCommit(() => this.keep(file));
  }

  private keep(file: TurnFile): void {
    const { id, version } = file.record;
    const known = this.files.get(id);
    if (known !== undefined && known.record.version > version) return;
    this.files.delete(id);
    this.files.set(id, file);
    if (this.files.size <= filesKept) return;
    const [oldest] = this.files.keys();
    if (oldest !== undefined) this.files.delete(oldest);
  }

  private async read(ids: readonly string[]): Promise<TurnFile[]> {
    if (ids.length === 0) return [];
    const rows = await this.reader.query<RawTurn>(
      `SELECT * FROM turn WHERE id IN (${ids.map(() => '?').join(', ')})`,
      [...ids],
    );
    const entries = await this.log.findAbout(ids);
    const alerts = await this.alerts.standingOn(ids);
    const records = rows.map(turnRecordOf);
    const cars = await this.sets.carsOfAll(records.flatMap((record) => record.set ?? []));
    const files: TurnFile[] = [];
    for (const record of records) {
      const plan = await this.plans.find(record.planId);
      if (plan === null) throw new Error(`turn ${record.id} has no step plan`);
      files.push(
        turnFileFrom({
          record,
          plan,
          entries: (entries.get(record.id) ?? []).map(entryOf),
          cars: (record.set === null ? undefined : cars.get(record.set)) ?? [],
          alerts: alerts.get(record.id) ?? [],
        }),
      );
    }
    return files;
  }
}

function entryOf({ id, receivedAt, body }: LoggedEntry) {
  return entryFrom({ id, receivedAt, body: body as EntryBody });
}
