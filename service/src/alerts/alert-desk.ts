import { Injectable } from '@nestjs/common';
import {
  type AlertCause,
  type AlertEvent,
  type CloseAlertRequest,
  type Instant,
  type PersonAccess,
  type SetAsideRequest,
  alertAfter,
  longestSetAsideMinutes,
} from '@stubpost/shared';
import { Access } from '../common/access';
import { Refusal } from '../common/refusal';
import { ChangeLog } from '../database/change-log';
import { type Transaction, UnitOfWork } from '../database/unit-of-work';
import { TurnRepository } from '../turns/turn.repository';
import type { AlertRecord } from './alert-record';
import { AlertTeller } from './alert-teller';
import { AlertRepository } from './alert.repository';

/** Causes that nobody may put out of sight: a train that stands unsecured, or that lacks a record the law asks for. */
const neverAside: readonly AlertCause[] = ['unsecured', 'no-required-record'];

/** Who does something about which alert, and when. */
export interface AlertAct {
  alertId: string;
  person: PersonAccess & { name: string };
  now: Instant;
}

/** What people do about alerts: take, set aside for a while, close with a cause. */
@Injectable()
export class AlertDesk {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly alerts: AlertRepository,
    private readonly turns: TurnRepository,
    private readonly changes: ChangeLog,
    private readonly access: Access,
    private readonly teller: AlertTeller,
  ) {}

  /**
   * Takes an alert over, also from somebody else: the last one to say so has it. What goes along is done in the same
   * transaction, or not at all.
   */
  take(act: AlertAct, along?: (transaction: Transaction) => Promise<void>): Promise<AlertRecord> {
    const { person, now } = act;
    const changed = (alert: AlertRecord): AlertRecord => ({
      ...alert,
      takenAt: now,
      takenBy: person.name,
      takenById: person.id,
      setAsideUntil: null,
      setAsideReason: null,
      setAsideBy: null,
    });
    return this.change(act, 'take', changed, async (transaction, alert) => {
      await along?.(transaction);
      await this.teller.tellOutcome(transaction, alert, 'taken');
    });
  }

  setAside(act: AlertAct, request: SetAsideRequest): Promise<AlertRecord> {
    const until = Date.parse(request.until);
    if (until <= act.now) throw new Refusal({ code: 'alert.until_past', message: 'that time has passed' });
    if (until > act.now + longestSetAsideMinutes * 60_000) {
      throw new Refusal({
        code: 'alert.until_far',
        message: `an alert is set aside for ${longestSetAsideMinutes} min at most`,
        facts: { longestMinutes: longestSetAsideMinutes },
      });
    }
    return this.change(act, 'set-aside', (alert) => {
      if (neverAside.includes(alert.cause)) {
        throw new Refusal({
          code: 'alert.never_aside',
          message: 'this alert stands until what it asks for is recorded',
          facts: { cause: alert.cause },
        });
      }
      return { ...alert, setAsideUntil: until, setAsideReason: request.reason, setAsideBy: act.person.name };
    });
  }

  close(act: AlertAct, request: CloseAlertRequest): Promise<AlertRecord> {
    return this.change(act, 'close', (alert) => ({
      ...alert,
      closedAt: act.now,
      closedBy: act.person.name,
      closedCause: request.cause,
    }));
  }

  private change(
    act: AlertAct,
    event: AlertEvent,
    changed: (alert: AlertRecord) => AlertRecord,
    afterwards?: (transaction: Transaction, alert: AlertRecord) => Promise<void>,
  ): Promise<AlertRecord> {
    return this.unitOfWork.run(async (transaction) => {
      const alert = await this.alerts.findById(transaction, act.alertId);
      if (alert === null) throw new Refusal({ code: 'alert.unknown', message: 'there is no such alert' });
      this.access.require(act.person, 'alerts.act', alert.terminalCode);
      const standing = alertAfter({ state: alert.state, taken: alert.takenAt !== null }, event);
      if (!standing.ok) {
        const message = `the alert is ${alert.state}`;
        throw new Refusal({ code: standing.error.code, message, facts: { state: alert.state } });
      }
      const kept = await this.alerts.update(transaction, { ...changed(alert), state: standing.value.state });
      await afterwards?.(transaction, kept);
      await this.tell(transaction, kept);
      return kept;
    });
  }

  /** A turn shows its alerts, so it has changed with them. */
  private async tell(transaction: Transaction, alert: AlertRecord): Promise<void> {
    const { id, version, terminalCode, turnId } = alert;
    await this.changes.append(transaction, { kind: 'alert', objectId: id, version, terminalCode });
    if (turnId === null) return;
    const turnVersion = await this.turns.touch(transaction, turnId);
    await this.changes.append(transaction, {
      kind: 'turn',
      objectId: turnId,
      version: turnVersion,
      terminalCode,
    });
  }
}
