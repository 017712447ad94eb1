import { Body, Controller, Get, Param, Put } from '@nestjs/common';
import {
  formatInstant,
  type UpdateDutyRosterRequest,
  updateDutyRosterSchema,
  type WireDutyRoster,
} from '@stubpost/shared';
import { CurrentPerson, Permit } from '../common/decorators';
import { Refusal } from '../common/refusal';
import type { CurrentPersonFacts } from '../common/signed-in';
import { ZodPipe } from '../common/zod.pipe';
import { DutyRosters } from './duty-rosters';
import { DutyRostersService } from './duty-rosters.service';

/** The duty roster of a terminal. */
@Controller('api/terminals/:code/duty-roster')
export class DutyController {
  constructor(
    private readonly rosters: DutyRosters,
    private readonly service: DutyRostersService,
  ) {}

  @Get()
  @Permit('roster.read', { terminal: 'param.code' })
  async read(@Param('code') code: string): Promise<WireDutyRoster> {
    const roster = await this.rosters.find(code);
    if (roster === null) {
      throw new Refusal({
        code: 'terminal.unknown',
        message: `there is no terminal ${code}`,
        facts: { terminal: code },
      });
    }
    return {
      terminal: code,
      zone: roster.zone,
      version: roster.version,
      shifts: roster.shifts.map((shift) => ({
        ...shift,
        from: formatInstant(shift.from),
        until: formatInstant(shift.until),
      })),
      people: roster.people.map(({ id, name, isSupervisor, phone, quiet }) => ({
        ...{ id, name, isSupervisor, hasPhone: phone !== null },
        quiet: quiet === null ? null : { from: quiet.from, until: quiet.until },
      })),
      steps: roster.steps.map((step) => ({ ...step, channels: [...step.channels] })),
      changedAt: roster.changedAt === null ? null : formatInstant(roster.changedAt),
      changedBy: roster.changedBy,
    };
  }

  @Put()
  @Permit('roster.edit', { terminal: 'param.code' })
  async change(
    @Param('code') code: string,
    @Body(new ZodPipe(updateDutyRosterSchema)) body: UpdateDutyRosterRequest,
    @CurrentPerson() person: CurrentPersonFacts,
  ): Promise<WireDutyRoster> {
    await this.service.change(code, body, person.name);
    return this.read(code);
  }
}
