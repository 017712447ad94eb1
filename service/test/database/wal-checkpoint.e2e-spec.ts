import { databaseFile } from '../../src/database/database-file';
import { walBytes } from '../../src/database/data-sources';
import { UnitOfWork } from '../../src/database/unit-of-work';
import { WalCheckpoint } from '../../src/database/wal-checkpoint';
import { bootApp, type Booted } from '../support/boot';

let booted: Booted;
beforeEach(async () => {
  booted = await bootApp();
});
afterEach(() => booted.close());

test('the write-ahead log is folded into the database between two pieces of work', async () => {
  const unitOfWork = booted.app.get(UnitOfWork);
  const write = (n: number) =>
    unitOfWork.run((transaction) =>
      transaction.execute('INSERT INTO counter (name, value) VALUES (?, ?)', [`${n} ${'x'.repeat(5000)}`, n]),
    );
  await Promise.all([...Array(40).keys()].map(write));
  const file = databaseFile(booted.dataDir);
  expect(walBytes(file)).toBeGreaterThan(100_000);
  const before = write(41);
  const fold = booted.app.get(WalCheckpoint).fold();
  await Promise.all([before, fold]);
  expect(walBytes(file)).toBe(0);
});
