import path from 'node:path';
import { DataSource } from 'typeorm';
import { FixedClock } from '../../src/common/clock';
import { type Change, ChangeFeed, ChangeLog } from '../../src/database/change-log';
import { Counters } from '../../src/database/counters';
import { openWriter, readerOptions } from '../../src/database/data-sources';
import { Reader } from '../../src/database/reader';
import { type Transaction, UnitOfWork } from '../../src/database/unit-of-work';
import { ENTITIES } from '../../src/entities';
import { temporaryFolder } from '../support/temporary-folder';

const now = Date.parse('2026-03-03T22:00:00Z');
const insert = 'INSERT INTO counter (name, value) VALUES (?, ?)';

let remove: () => void;
let writer: DataSource;
let readerSource: DataSource;
let reader: Reader;
let unitOfWork: UnitOfWork;

beforeEach(async () => {
  const temporary = temporaryFolder();
  remove = temporary.remove;
  const options = { file: path.join(temporary.folder, 'test.sqlite'), entities: ENTITIES };
  writer = await openWriter(options);
  readerSource = await new DataSource(readerOptions(options)).initialize();
  reader = new Reader(readerSource);
  unitOfWork = new UnitOfWork(writer);
});

afterEach(async () => {
  await readerSource.destroy();
  await writer.destroy();
  remove();
});

/** Lets everything that is ready go on, so that other work can come in between. */
const pause = () => new Promise<void>((resolve) => setImmediate(resolve));

async function names(): Promise<string[]> {
  const rows = await reader.query<{ name: string }>('SELECT name FROM counter ORDER BY name');
  return rows.map((row) => row.name);
}

/** Fifty pieces of work at once, each of two rows, every tenth of which fails after its first row. */
function fiftyAtOnce(run: (work: (query: Transaction['query']) => Promise<void>) => Promise<void>) {
  return Promise.allSettled(
    [...Array(50).keys()].map((n) =>
      run(async (query) => {
        await query(insert, [`${n}-first`, n]);
        await pause();
        if (n % 10 === 0) throw new Error('meant to fail');
        await query(insert, [`${n}-second`, n]);
      }),
    ),
  );
}

describe('without the queue, transactions on the one connection destroy each other', () => {
  test('an acknowledged row is gone when somebody else rolls back', async () => {
    const failing = writer.transaction(async (manager) => {
      await manager.query(insert, ['failing', 1]);
      await pause();
      await pause();
      throw new Error('meant to fail');
    });
    await pause();
    await writer.query(insert, ['acknowledged', 1]);
    await expect(failing).rejects.toThrow('meant to fail');
    expect(await names()).not.toContain('acknowledged');
  });

  test('of fifty at once, rows are lost or half applied', async () => {
    await fiftyAtOnce((work) =>
      writer.transaction((manager) => work((sql, values) => manager.query(sql, values))),
    );
    expect((await names()).length).not.toBe(90);
  });
});

describe('UnitOfWork', () => {
  test('of fifty at once, exactly those that did not fail are kept, whole', async () => {
    const outcomes = await fiftyAtOnce((work) => unitOfWork.run((transaction) => work(transaction.query)));
    expect(outcomes.filter((outcome) => outcome.status === 'fulfilled')).toHaveLength(45);
    const kept = await names();
    expect(kept).toHaveLength(90);
    expect(kept).not.toContain('0-first');
  });

  test('an acknowledged row outlives the rollback of others', async () => {
    const failing = unitOfWork.run(async (transaction) => {
      await transaction.query(insert, ['failing', 1]);
      await pause();
      throw new Error('meant to fail');
    });
    const kept = unitOfWork.run((transaction) => transaction.query(insert, ['acknowledged', 1]));
    await expect(failing).rejects.toThrow('meant to fail');
    await kept;
    expect(await names()).toEqual(['acknowledged']);
  });

  test('work is done in the order it was asked for', async () => {
    const order: number[] = [];
    await Promise.all(
      [30, 0, 10].map((turns, index) =>
        unitOfWork.run(async () => {
          for (let turn = 0; turn < turns; turn += 1) await pause();
          order.push(index);
        }),
      ),
    );
    expect(order).toEqual([0, 1, 2]);
  });

  test('readers see nothing of work that is not committed', async () => {
    await unitOfWork.run(async (transaction) => {
      await transaction.query(insert, ['open', 1]);
      expect(await names()).toEqual([]);
    });
    expect(await names()).toEqual(['open']);
  });

  test('the reader cannot write', async () => {
    await expect(reader.query(insert, ['forbidden', 1])).rejects.toThrow(/readonly/);
  });

  test('work inside work is refused instead of waiting for itself for ever', async () => {
    const nested = unitOfWork.run(() => unitOfWork.run(() => Promise.resolve('never')));
    await expect(nested).rejects.toThrow('pass the transaction on');
    await expect(unitOfWork.run(() => Promise.resolve('goes on'))).resolves.toBe('goes on');
  });

  test('what is to be done after the commit happens in order, not after a rollback, and cannot spoil the commit', async () => {
    const told: string[] = [];
    const failing = unitOfWork.run((transaction) => {
      transaction.afterCommit(() => told.push('rolled back'));
      return Promise.reject(new Error('meant to fail'));
    });
    await expect(failing).rejects.toThrow('meant to fail');
    await unitOfWork.run(async (transaction) => {
      await transaction.query(insert, ['kept', 1]);
      transaction.afterCommit(() => {
        throw new Error('a listener that fails');
      });
      transaction.afterCommit(() => told.push('first'));
    });
    await unitOfWork.run((transaction) => {
      transaction.afterCommit(() => told.push('second'));
      return Promise.resolve();
    });
    expect(told).toEqual(['first', 'second']);
    expect(await names()).toEqual(['kept']);
  });

  test('a listener may queue work of its own', async () => {
    let later: Promise<unknown> | undefined;
    await unitOfWork.run((transaction) => {
      transaction.afterCommit(() => {
        later = unitOfWork.run((next) => next.query(insert, ['by the listener', 1]));
      });
      return Promise.resolve();
    });
    await later;
    expect(await names()).toEqual(['by the listener']);
  });

  test('a guarded update says how many rows it changed', async () => {
    await unitOfWork.run(async (transaction) => {
      await transaction.query(insert, ['guarded', 1]);
      const update = 'UPDATE counter SET value = 2 WHERE name = ? AND value = ?';
      expect(await transaction.execute(update, ['guarded', 7])).toBe(0);
      expect(await transaction.execute(update, ['guarded', 1])).toBe(1);
    });
  });
});

describe('ChangeLog', () => {
  const change = { kind: 'turn', objectId: 'a', version: 1, terminalCode: 'HBR' } as const;

  test('numbers grow by one, also past a rollback, and are told after the commit', async () => {
    const feed = new ChangeFeed();
    const log = new ChangeLog(new Counters(), feed, new FixedClock(now));
    const told: Change[] = [];
    feed.changes.subscribe((seen) => told.push(seen));
    await unitOfWork.run((transaction) => log.append(transaction, change));
    const failing = unitOfWork.run(async (transaction) => {
      await log.append(transaction, change);
      throw new Error('meant to fail');
    });
    await expect(failing).rejects.toThrow('meant to fail');
    await unitOfWork.run((transaction) => log.append(transaction, { ...change, version: 2 }));
    expect(told.map(({ number, version, at }) => ({ number, version, at }))).toEqual([
      { number: 1, version: 1, at: now },
      { number: 2, version: 2, at: now },
    ]);
    const rows = await reader.query('SELECT number, version FROM change ORDER BY number');
    expect(rows).toEqual([
      { number: 1, version: 1 },
      { number: 2, version: 2 },
    ]);
  });
});
