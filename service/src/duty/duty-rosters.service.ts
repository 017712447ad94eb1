import { Injectable } from '@nestjs/common';
import { addSeconds, type UpdateDutyRosterRequest } from '@stubpost/shared';
import { Clock } from '../common/clock';
import { Refusal } from '../common/refusal';
import { Settings } from '../database/settings';
import { UnitOfWork } from '../database/unit-of-work';
import { DUTY_ROSTER, DutyRosters, type KeptRoster } from './duty-rosters';

/** Times on duty that are over for so long are let go of. Our choice. */
const keepPastSeconds = 14 * 24 * 60 * 60;

/** Changes rosters. */
@Injectable()
export class DutyRostersService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly settings: Settings,
    private readonly rosters: DutyRosters,
    private readonly clock: Clock,
  ) {}

  /** Replaces a roster, if it is still at the version that was seen. */
  change(terminalCode: string, request: UpdateDutyRosterRequest, changedBy: string): Promise<void> {
    return this.unitOfWork.run(async (transaction) => {
      const roster = await this.rosters.find(terminalCode);
      if (roster === null) {
        throw new Refusal({
          code: 'terminal.unknown',
          message: `there is no terminal ${terminalCode}`,
          facts: { terminal: terminalCode },
        });
      }
      if (roster.version !== request.version) {
        throw new Refusal({ code: 'roster.changed', message: 'somebody changed this roster meanwhile' });
      }
      requireFit(
        request,
        new Set(roster.people.map(({ id }) => id)),
        new Set(roster.shifts.map(({ personId }) => personId)),
      );
      const value = this.keptOf(request);
      await this.settings.put(transaction, { scope: terminalCode, name: DUTY_ROSTER, value, changedBy });
    });
  }

  private keptOf({ shifts, quietHours, steps }: UpdateDutyRosterRequest): KeptRoster {
    const oldest = addSeconds(this.clock.now(), -keepPastSeconds);
    return {
      shifts: shifts
        .map((shift) => ({ ...shift, from: Date.parse(shift.from), until: Date.parse(shift.until) }))
        .filter(({ until }) => until > oldest)
        .sort((a, b) => a.from - b.from || a.until - b.until),
      quietHours,
      steps,
    };
  }
}

/** New names must be of people who may act on alerts here; somebody who has lost the right may stay on until taken off. */
function requireFit(
  { shifts, quietHours }: UpdateDutyRosterRequest,
  fit: ReadonlySet<string>,
  known: ReadonlySet<string>,
): void {
  const unfit = [...shifts, ...quietHours].find(({ personId }) => !fit.has(personId) && !known.has(personId));
  if (unfit === undefined) return;
  throw new Refusal({
    code: 'roster.person_unfit',
    message: 'only people who may act on alerts at the terminal stand on its roster',
    facts: { personId: unfit.personId },
  });
}
