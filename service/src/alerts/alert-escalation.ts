import { Injectable } from '@nestjs/common';
import type { Instant } from '@stubpost/shared';
import { Reader } from '../database/reader';
import { UnitOfWork } from '../database/unit-of-work';
import { DutyRosters, type ReachableRoster } from '../duty/duty-rosters';
import { type AlertRecord, type RawAlert, alertRecordOf } from './alert-record';
import { AlertTeller } from './alert-teller';
import { AlertRepository } from './alert.repository';

/** Tells the next people of alerts that nobody has taken, as of a moment. Everything follows from the tables. */
@Injectable()
export class AlertEscalation {
  constructor(
    private readonly reader: Reader,
    private readonly unitOfWork: UnitOfWork,
    private readonly rosters: DutyRosters,
    private readonly alerts: AlertRepository,
    private readonly teller: AlertTeller,
  ) {}

  async follow(now: Instant): Promise<void> {
    const rows = await this.reader.query<RawAlert>(
      `SELECT * FROM alert WHERE state = 'raised' ORDER BY raised_at, id`,
    );
    if (rows.length === 0) return;
    const told = await this.toldOfRaised();
    const rosters = new Map<string, ReachableRoster | null>();
    for (const alert of rows.map(alertRecordOf)) {
      const code = alert.terminalCode;
      if (!rosters.has(code)) rosters.set(code, await this.rosters.find(code));
      const roster = rosters.get(code) ?? null;
      if (roster === null) continue;
      if (this.teller.isTellingDue(alert, roster, told.get(alert.id) ?? new Set(), now))
        await this.tell(alert, now);
    }
  }

  /** Looks again inside the transaction: somebody may have taken it meanwhile. */
  private tell({ id }: AlertRecord, now: Instant): Promise<void> {
    return this.unitOfWork.run(async (transaction) => {
      const alert = await this.alerts.findById(transaction, id);
      if (alert !== null) await this.teller.tell(transaction, alert, now);
    });
  }

  private async toldOfRaised(): Promise<Map<string, Set<string>>> {
    const rows = await this.reader.query<{ alert_id: string; person_id: string; channel: string }>(
      `SELECT m.alert_id, m.person_id, m.channel FROM message m JOIN alert a ON a.id = m.alert_id
       WHERE a.state = 'raised' AND m.occasion = 'told'`,
    );
    const byAlert = new Map<string, Set<string>>();
    for (const row of rows) {
      const known = byAlert.get(row.alert_id) ?? new Set<string>();
      byAlert.set(row.alert_id, known.add(`${row.person_id} ${row.channel}`));
    }
    return byAlert;
  }
}
