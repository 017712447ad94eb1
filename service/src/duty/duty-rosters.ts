import { Injectable } from '@nestjs/common';
import {
  ALL_TERMINALS,
  type DutyPerson,
  type DutyRoster,
  type DutyShift,
  type EscalationStep,
  type QuietHours,
  rolesWith,
  shippedEscalation,
} from '@stubpost/shared';
import { Reader } from '../database/reader';
import { Settings } from '../database/settings';

/** Name of the setting that holds a terminal's roster. */
export const DUTY_ROSTER = 'duty-roster';

/** What is kept under that name. */
export interface KeptRoster {
  shifts: DutyShift[];
  quietHours: (QuietHours & { personId: string })[];
  steps: EscalationStep[];
}

/** Somebody who can be told, with where. */
export interface ReachablePerson extends DutyPerson {
  email: string;
  phone: string | null;
}

/** A roster with its people's addresses, and where it stands. */
export interface ReachableRoster extends DutyRoster {
  people: readonly ReachablePerson[];
  terminal: { code: string; name: string };
  version: number;
  changedBy: string | null;
  changedAt: number | null;
}

interface PersonRow {
  id: string;
  name: string;
  email: string;
  phone: string | null;
  supervises: number;
}

/** Who is on duty where, and who can be told at all: those who may act on alerts at the terminal. */
@Injectable()
export class DutyRosters {
  constructor(
    private readonly reader: Reader,
    private readonly settings: Settings,
  ) {}

  /** The roster of a terminal; null when there is no such terminal. */
  async find(terminalCode: string): Promise<ReachableRoster | null> {
    const [terminal] = await this.reader.query<{ code: string; name: string; zone: string }>(
      'SELECT code, name, zone FROM terminal WHERE code = ?',
      [terminalCode],
    );
    if (terminal === undefined) return null;
    const { code, name, zone } = terminal;
    const kept = await this.settings.find<KeptRoster>(terminalCode, DUTY_ROSTER);
    const quiet = new Map(kept?.value.quietHours.map((hours) => [hours.personId, hours]));
    const people = (await this.peopleAt(terminalCode)).map((row) => ({
      id: row.id,
      name: row.name,
      email: row.email,
      phone: row.phone,
      isSupervisor: Number(row.supervises) > 0,
      quiet: quiet.get(row.id) ?? null,
    }));
    return {
      terminal: { code, name },
      zone,
      people,
      shifts: kept?.value.shifts ?? [],
      steps: kept?.value.steps ?? shippedEscalation,
      version: kept?.version ?? 0,
      changedBy: kept?.changedBy ?? null,
      changedAt: kept?.changedAt ?? null,
    };
  }

  private peopleAt(terminalCode: string): Promise<PersonRow[]> {
    const roles = rolesWith('alerts.act');
    return this.reader.query<PersonRow>(
      `SELECT p.id, p.name, p.email, p.phone, MAX(r.role = 'supervisor') AS supervises
       FROM person p JOIN person_role r ON r.person_id = p.id
       WHERE p.active = ? AND r.terminal IN (?, ?) AND r.role IN (${roles.map(() => '?').join(', ')})
       GROUP BY p.id ORDER BY p.name, p.id`,
      [true, terminalCode, ALL_TERMINALS, ...roles],
    );
  }
}
