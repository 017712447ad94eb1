import { Injectable } from '@nestjs/common';
import type { WireEntry } from '@stubpost/shared';
import { Access } from '../common/access';
import type { CurrentPersonFacts } from '../common/signed-in';
import { type Transaction, UnitOfWork } from '../database/unit-of-work';
import { EntryLog } from '../records/entry-log';
import { EntryRecorder, type RecordCommand, type Recorded, unknownTurn } from './entry-recorder';
import { TurnChanges } from './turn-changes';
import type { TurnFile } from './turn-file';
import { TurnFiles } from './turn-files';
import { wireEntryOf } from './wire-entry';

/** Turns: recording what happens, and reading single ones. */
@Injectable()
export class TurnsService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly files: TurnFiles,
    private readonly recorder: EntryRecorder,
    private readonly changes: TurnChanges,
    private readonly log: EntryLog,
    private readonly access: Access,
  ) {}

  /** A turn that somebody may look at. */
  async require(id: string, person: CurrentPersonFacts): Promise<TurnFile> {
    const file = await this.files.find(id);
    if (file === null) throw unknownTurn();
    this.access.require(person, 'board.read', file.record.terminalCode);
    return file;
  }

  /** The log of a turn in sequence order. */
  async entriesOf(id: string, person: CurrentPersonFacts): Promise<WireEntry[]> {
    const { record } = await this.require(id, person);
    this.access.require(person, 'entries.read', record.terminalCode);
    const logged = (await this.log.findAbout([id])).get(id) ?? [];
    return logged.map(wireEntryOf);
  }

  /** Records one entry in a transaction of its own. */
  async recordEntry(command: RecordCommand): Promise<Recorded> {
    const [recorded] = await this.recordEntries([command]);
    if (recorded === undefined) throw new Error('a command gave no receipt');
    return recorded;
  }

  /** Records entries one after the other in one transaction: all are kept, or none. */
  recordEntries(commands: readonly RecordCommand[]): Promise<Recorded[]> {
    return this.unitOfWork.run(async (transaction) => {
      const recorded = await this.recordAll(transaction, commands);
      await this.changes.write(transaction);
      return recorded;
    });
  }

  /** The same for days gone by, when a whole history is told: nobody who watches the present hears of each turn. */
  recordPastEntries(commands: readonly RecordCommand[]): Promise<Recorded[]> {
    return this.unitOfWork.run((transaction) => this.recordAll(transaction, commands));
  }

  private async recordAll(transaction: Transaction, commands: readonly RecordCommand[]): Promise<Recorded[]> {
    const recorded: Recorded[] = [];
    for (const command of commands) recorded.push(await this.recorder.record(transaction, command));
    return recorded;
  }
}
