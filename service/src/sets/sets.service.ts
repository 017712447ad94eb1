import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import type { Instant, PutSetRequest, WireSet } from '@stubpost/shared';
import { Refusal } from '../common/refusal';
import { ChangeLog } from '../database/change-log';
import { type Transaction, UnitOfWork } from '../database/unit-of-work';
import { TurnRepository } from '../turns/turn.repository';
import { SetRepository } from './set.repository';

/** What a set is to be made of. */
export interface PutSetCommand {
  label: string;
  request: PutSetRequest;
  now: Instant;
}

/** Equipment sets: what they are made of, and the turns that show it. */
@Injectable()
export class SetsService {
  constructor(
    private readonly repository: SetRepository,
    private readonly turns: TurnRepository,
    private readonly changes: ChangeLog,
    private readonly unitOfWork: UnitOfWork,
  ) {}

  list(): Promise<WireSet[]> {
    return this.repository.findAll();
  }

  /** Cars of a set in order from the bumping post, locomotives left out; none for a set nobody has described. */
  carsOf(transaction: Transaction, label: string): Promise<string[]> {
    return this.repository.findCarsIn(transaction, label);
  }

  /** Cars of some sets by label. */
  carsOfAll(labels: readonly string[]): Promise<Map<string, string[]>> {
    return this.repository.findCarsOf([...new Set(labels)]);
  }

  put(command: PutSetCommand): Promise<WireSet> {
    return this.unitOfWork.run((transaction) => this.putIn(transaction, command));
  }

  /** The same inside a transaction that is already open. */
  async putIn(transaction: Transaction, command: PutSetCommand): Promise<WireSet> {
    const { label, request, now } = command;
    const others = await this.repository.findLabelsOf(
      transaction,
      request.units.map((unit) => unit.number),
    );
    const before = await this.repository.findByLabel(transaction, label);
    const seen = request.version ?? 0;
    const id = before?.id ?? randomUUID();
    if (before === null) await this.repository.insert(transaction, { id, label, createdAt: now });
    const version = before?.version ?? 0;
    const leadingUnit = request.leadingUnit ?? null;
    if (seen !== version || !(await this.repository.update(transaction, { id, version, leadingUnit }))) {
      throw new Refusal({ code: 'set.changed', message: 'somebody was faster', facts: { version } });
    }
    const units = request.units.map((unit) => ({ id: randomUUID(), unit }));
    await this.repository.putUnits(transaction, id, units, now);
    await this.showOnTurns(transaction, new Set([label, ...others]));
    const after = await this.repository.findByLabel(transaction, label);
    if (after === null) throw new Error(`set ${label} was not kept`);
    return after;
  }

  private async showOnTurns(transaction: Transaction, labels: Iterable<string>): Promise<void> {
    for (const label of labels) {
      for (const turn of await this.turns.touchUnsettledOfSet(transaction, label)) {
        await this.changes.append(transaction, {
          kind: 'turn',
          objectId: turn.id,
          version: turn.version,
          terminalCode: turn.terminalCode,
        });
      }
    }
  }
}
