// A process to be killed: writes changes through the unit of work as fast as it can and says which ones are kept.
// node acknowledging-writer.mjs <database file> <FULL|NORMAL>
import { writeSync } from 'node:fs';
import { FixedClock } from '../../dist/common/clock.js';
import { ChangeFeed, ChangeLog } from '../../dist/database/change-log.js';
import { Counters } from '../../dist/database/counters.js';
import { openWriter } from '../../dist/database/data-sources.js';
import { UnitOfWork } from '../../dist/database/unit-of-work.js';

const [, , file, synchronous] = process.argv;
const writer = await openWriter({ file, entities: [] });
// The control: what the driver would do by itself, without our pragmas.
if (synchronous === 'NORMAL') await writer.query('PRAGMA synchronous = NORMAL');
const unitOfWork = new UnitOfWork(writer);
const log = new ChangeLog(new Counters(), new ChangeFeed(), new FixedClock(0));
const change = { kind: 'turn', objectId: 'turn', version: 1, terminalCode: 'HBR' };
for (;;) {
  const number = await unitOfWork.run((transaction) => log.append(transaction, change));
  writeSync(1, `${number}\n`);
}
