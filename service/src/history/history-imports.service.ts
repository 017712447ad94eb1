import { randomUUID } from 'node:crypto';
import { Injectable, Logger, type OnApplicationBootstrap, type OnModuleDestroy } from '@nestjs/common';
import { may, type PersonAccess, type WireHistoryImport } from '@stubpost/shared';
import { Clock } from '../common/clock';
import { Refusal } from '../common/refusal';
import { UnitOfWork } from '../database/unit-of-work';
import { TerminalsReadModel } from '../terminals/terminals.read-model';
import type { PastDeparture } from './departures-table';
import { readDeparturesTable } from './departures-table.reader';
import type { HistoryImportRow, RowProblem } from './history-import.entity';
import { HistoryImportsRepository } from './history-imports.repository';

/** A table as it was sent. */
export interface UploadedTable {
  fileName: string;
  content: Buffer;
}

const mostProblemsKept = 200;

/** Loads tables of past departures: all rows of a table or none, away from the request that brought it. */
@Injectable()
export class HistoryImportsService implements OnApplicationBootstrap, OnModuleDestroy {
  private readonly logger = new Logger(HistoryImportsService.name);
  private running: Promise<void> = Promise.resolve();

  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly imports: HistoryImportsRepository,
    private readonly terminals: TerminalsReadModel,
    private readonly clock: Clock,
  ) {}

  async onApplicationBootstrap(): Promise<void> {
    const problem = {
      line: null,
      message: 'the service ended while it read this table; nothing was loaded, send it again',
    };
    await this.unitOfWork.run((transaction) => this.imports.refuseUnfinished(transaction, problem));
  }

  async onModuleDestroy(): Promise<void> {
    await this.running;
  }

  /** Notes the import and answers at once; the reading goes on by itself, one table after the other. */
  async start(table: UploadedTable, person: PersonAccess & { name: string }): Promise<string> {
    if (table.content.includes(0)) {
      throw new Refusal({ code: 'history.not_a_table', message: `${table.fileName} is not a text table` });
    }
    const id = randomUUID();
    const now = this.clock.now();
    await this.unitOfWork.run((transaction) =>
      this.imports.start(transaction, { id, fileName: table.fileName, uploadedBy: person.name, now }),
    );
    this.running = this.running.then(() => this.read(id, table, person));
    return id;
  }

  async require(id: string): Promise<WireHistoryImport> {
    const row = await this.imports.find(id);
    if (row === null)
      throw new Refusal({ code: 'history.import_unknown', message: 'there is no such import' });
    return toWireImport(row);
  }

  async list(): Promise<WireHistoryImport[]> {
    return (await this.imports.latest()).map(toWireImport);
  }

  private async read(id: string, table: UploadedTable, person: PersonAccess): Promise<void> {
    try {
      const read = await readDeparturesTable(table.content);
      const problems = [...read.problems, ...(await this.problemsOfTerminals(read.rows, person))];
      await (problems.length > 0 ? this.refuse(id, problems) : this.load(id, read.rows));
    } catch (error) {
      this.logger.error(`import ${id}: ${error instanceof Error ? error.stack : String(error)}`);
      await this.refuse(id, [{ line: null, message: 'something went wrong here; nothing was loaded' }]);
    }
  }

  private async problemsOfTerminals(
    rows: readonly PastDeparture[],
    person: PersonAccess,
  ): Promise<RowProblem[]> {
    const known = new Set((await this.terminals.all()).map((terminal) => terminal.code));
    return rows.flatMap((row) => {
      if (!known.has(row.terminalCode))
        return [{ line: row.line, message: `the terminal ${row.terminalCode} is not known` }];
      if (!may(person, 'history.import', row.terminalCode))
        return [{ line: row.line, message: `you may not load departures of ${row.terminalCode}` }];
      return [];
    });
  }

  private refuse(id: string, problems: RowProblem[]): Promise<void> {
    const told = problems.slice(0, mostProblemsKept);
    return this.unitOfWork.run((transaction) =>
      this.imports.finish(transaction, id, { state: 'refused', rows: 0, problems: told }),
    );
  }

  private load(id: string, rows: PastDeparture[]): Promise<void> {
    return this.unitOfWork.run(async (transaction) => {
      const lines = await this.imports.linesAlreadyLoaded(transaction, rows);
      if (lines.length > 0) {
        const problems = lines
          .slice(0, mostProblemsKept)
          .map((line) => ({ line, message: 'this departure is loaded already' }));
        await this.imports.finish(transaction, id, { state: 'refused', rows: 0, problems });
        return;
      }
      await this.imports.insertRows(transaction, id, rows);
      await this.imports.finish(transaction, id, { state: 'loaded', rows: rows.length, problems: [] });
    });
  }
}

function toWireImport(row: HistoryImportRow): WireHistoryImport {
  return {
    id: row.id,
    state: row.state as WireHistoryImport['state'],
    fileName: row.fileName,
    rows: row.rowCount,
    problems: row.problems,
  };
}
