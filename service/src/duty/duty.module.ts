import { Module } from '@nestjs/common';
import { DutyController } from './duty.controller';
import { DutyRosters } from './duty-rosters';
import { DutyRostersService } from './duty-rosters.service';

/** Who is on the desk when, and who is told when nobody takes an alert. */
@Module({
  controllers: [DutyController],
  providers: [DutyRosters, DutyRostersService],
  exports: [DutyRosters, DutyRostersService],
})
export class DutyModule {}
