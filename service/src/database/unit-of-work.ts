import { AsyncLocalStorage } from 'node:async_hooks';
import { Inject, Injectable, Logger } from '@nestjs/common';
import type { DataSource, EntityManager } from 'typeorm';
import { WRITER } from './tokens';

/** What a piece of work gets while its transaction is open. It must not be kept after that. */
export interface Transaction {
  readonly manager: EntityManager;
  /** Rows of a SELECT or of a RETURNING clause. */
  query<Rows>(sql: string, parameters?: unknown[]): Promise<Rows>;
  /** Runs a statement and says how many rows it changed: the guard of `WHERE id = ? AND version = ?`. */
  execute(sql: string, parameters?: unknown[]): Promise<number>;
  /** Does something once the commit is on disk, in the order of commits; not at all after a rollback. */
  afterCommit(action: () => void): void;
}

/**
 * The only way to write. One connection cannot hold two transactions: two that overlap share it, and the rollback of
 * one takes the acknowledged rows of the other along. So all of them queue here, first come, first served. Keep
 * network and timers out of the work: everybody else waits.
 */
@Injectable()
export class UnitOfWork {
  private readonly logger = new Logger(UnitOfWork.name);
  private readonly inside = new AsyncLocalStorage<{ open: boolean }>();
  private tail: Promise<unknown> = Promise.resolve();

  constructor(@Inject(WRITER) private readonly writer: DataSource) {}

  /** Runs the work in a transaction of its own: all of it is kept, or, when it throws, nothing. */
  run<Outcome>(work: (transaction: Transaction) => Promise<Outcome>): Promise<Outcome> {
    if (this.inside.getStore()?.open === true) {
      return Promise.reject(
        new Error('UnitOfWork.run inside a unit of work would wait for itself: pass the transaction on'),
      );
    }
    const outcome = this.tail.then(() => this.transact(work));
    this.tail = outcome.catch(() => undefined);
    return outcome;
  }

  /** Runs something on the writing connection while no transaction is open: checkpoints, backups, pragmas. */
  between<Outcome>(action: (writer: DataSource) => Promise<Outcome>): Promise<Outcome> {
    const outcome = this.tail.then(() => action(this.writer));
    this.tail = outcome.catch(() => undefined);
    return outcome;
  }

  /** Resolves when everything that was queued up to now is done. */
  async drain(): Promise<void> {
    await this.tail;
  }

  private async transact<Outcome>(work: (transaction: Transaction) => Promise<Outcome>): Promise<Outcome> {
    const afterwards: (() => void)[] = [];
    const scope = { open: true };
    try {
      const outcome = await this.inside.run(scope, () =>
        this.writer.transaction((manager) => work(transactionOf(manager, afterwards))),
      );
      // Listeners may queue work of their own: what they start is not inside this transaction any more.
      scope.open = false;
      for (const action of afterwards) this.attempt(action);
      return outcome;
    } finally {
      scope.open = false;
    }
  }

  /** The rows are kept by now: a listener that fails must not make the writer believe otherwise. */
  private attempt(action: () => void): void {
    try {
      action();
    } catch (error) {
      this.logger.error(`after commit: ${error instanceof Error ? error.stack : String(error)}`);
    }
  }
}

function transactionOf(manager: EntityManager, afterwards: (() => void)[]): Transaction {
  return {
    manager,
    query: <Rows>(sql: string, parameters: unknown[] = []) => manager.query<Rows>(sql, parameters),
    execute: async (sql, parameters = []) => {
      const runner = manager.queryRunner;
      if (runner === undefined) throw new Error('the transaction is over');
      const result = await runner.query(sql, parameters, true);
      return result.affected ?? 0;
    },
    afterCommit: (action) => {
      afterwards.push(action);
    },
  };
}
