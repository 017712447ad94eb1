// A process to be killed: writes changes through the unit of work as fast as it can and says which ones are kept.
// node acknowledging-writer.cjs <database file> <FULL|NORMAL>
const { writeSync } = require('node:fs');
const { FixedClock } = require('../../dist/common/clock');
const { ChangeFeed, ChangeLog } = require('../../dist/database/change-log');
const { Counters } = require('../../dist/database/counters');
const { openWriter } = require('../../dist/database/data-sources');
const { UnitOfWork } = require('../../dist/database/unit-of-work');

async function writeForEver(file, synchronous) {
  const writer = await openWriter({ file, entities: [] });
  // The control: what the driver would do by itself, without our pragmas.
  if (synchronous === 'NORMAL') await writer.query('PRAGMA synchronous = NORMAL');
  const unitOfWork = new UnitOfWork(writer);
  const log = new ChangeLog(new Counters(), new ChangeFeed(), new FixedClock(0));
  for (;;) {
    const number = await unitOfWork.run((transaction) =>
      log.append(transaction, { kind: 'turn', objectId: 'turn', version: 1, terminalCode: 'HBR' }),
    );
    writeSync(1, `${number}\n`);
  }
}

void writeForEver(process.argv[2], process.argv[3]);
