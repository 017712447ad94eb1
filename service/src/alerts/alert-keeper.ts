import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { type AlertEvent, type Finding, type Instant, alertAfter } from '@stubpost/shared';
import { ChangeLog } from '../database/change-log';
import type { Transaction } from '../database/unit-of-work';
import { type AlertRecord, isStanding } from './alert-record';
import { mostUrgentFirst } from './alert.read-model';
import { AlertTeller } from './alert-teller';
import { AlertRepository } from './alert.repository';
import { closedGapWords, subjectWords } from './alert-words';
import { LatenessRules } from './lateness-rules';
import { type CauseStep, isBlank, isNews, lookAt } from './turn-look';
import { WatchRepository } from './watch.repository';
import type { WatchedTurn } from './watched-turn';

/** How the alerts of a turn stand after a look. */
export interface AlertsAfterLook {
  /** Those that stand, the most urgent first. */
  alerts: readonly AlertRecord[];
  /** Whether any alert was raised, updated, cleared or came back. */
  isChanged: boolean;
  /** Whether nothing stands and no hold time runs. */
  isQuiet: boolean;
}

/**
 * Raises, updates and clears the alerts of a turn inside an open transaction. What it does follows from the facts and
 * from what the table remembers, never from the fact that it was called: twice the same look changes nothing.
 */
@Injectable()
export class AlertKeeper {
  constructor(
    private readonly alerts: AlertRepository,
    private readonly watches: WatchRepository,
    private readonly rules: LatenessRules,
    private readonly changes: ChangeLog,
    private readonly teller: AlertTeller,
  ) {}

  async observe(
    transaction: Transaction,
    turn: WatchedTurn & { alerts: readonly AlertRecord[] },
    now: Instant,
  ): Promise<AlertsAfterLook> {
    const rules = await this.rules.of(turn.terminalCode, turn.zone);
    const memories = await this.watches.findOf(transaction, turn.turnId);
    const steps = lookAt(turn, rules, memories, now);
    const standing = new Map(turn.alerts.map((alert) => [alert.cause, alert]));
    let isChanged = false;
    for (const step of steps) {
      const before = standing.get(step.cause) ?? null;
      const followed = await this.follow(transaction, { turn, step, before, now });
      if (followed !== before) isChanged = true;
      if (followed !== null && isStanding(followed)) standing.set(step.cause, followed);
      else standing.delete(step.cause);
    }
    const alerts = [...standing.values()].sort(mostUrgentFirst);
    const isQuiet = alerts.length === 0 && steps.every((step) => isBlank(step.memory));
    return { alerts, isChanged, isQuiet };
  }

  /** Clears everything on a turn that is not looked at any more. */
  async release(
    transaction: Transaction,
    turn: { turnId: string; alerts: readonly AlertRecord[] },
    now: Instant,
  ): Promise<void> {
    for (const alert of turn.alerts)
      await this.keep(transaction, { ...after(alert, 'clear'), clearedAt: now });
    for (const cause of (await this.watches.findOf(transaction, turn.turnId)).keys()) {
      await this.watches.forget(transaction, turn.turnId, cause);
    }
  }

  private async follow(
    transaction: Transaction,
    look: { turn: WatchedTurn; step: CauseStep; before: AlertRecord | null; now: Instant },
  ): Promise<AlertRecord | null> {
    const { turn, step, now } = look;
    const { cause, memory, finding } = step;
    if (isNews(step)) await this.watches.keep(transaction, { subjectId: turn.turnId, cause, memory, now });
    const before = await this.backFromAside(transaction, look.before, now);
    switch (step.action) {
      case 'none':
        return before;
      case 'raise':
      case 'update':
        if (finding === null) throw new Error(`${cause} is to be told without a finding`);
        if (before !== null) return this.keep(transaction, { ...before, ...wordsOf(turn, finding) });
        return this.raise(transaction, turn, finding, now);
      case 'clear':
        if (before === null) return null;
        return this.keep(transaction, {
          ...after(before, 'clear'),
          clearedAt: now,
          ...(cause === 'unsecured' ? { lines: [closedGapWords(turn.facts, now)] } : {}),
        });
    }
  }

  /** An alert that was set aside returns by itself when its time is up. */
  private async backFromAside(
    transaction: Transaction,
    alert: AlertRecord | null,
    now: Instant,
  ): Promise<AlertRecord | null> {
    if (alert?.state !== 'set-aside' || alert.setAsideUntil === null || now < alert.setAsideUntil)
      return alert;
    const back = { setAsideUntil: null, setAsideReason: null, setAsideBy: null };
    return this.keep(transaction, { ...after(alert, 'return'), ...back });
  }

  private async raise(
    transaction: Transaction,
    turn: WatchedTurn,
    finding: Finding,
    now: Instant,
  ): Promise<AlertRecord> {
    const last = await this.alerts.findLast(transaction, turn.turnId, finding.cause);
    const alert: AlertRecord = {
      id: randomUUID(),
      version: 1,
      terminalCode: turn.terminalCode,
      serviceDate: turn.serviceDate,
      subjectKind: 'turn',
      subjectId: turn.turnId,
      turnId: turn.turnId,
      cause: finding.cause,
      state: 'raised',
      ...wordsOf(turn, finding),
      raisedAt: now,
      takenAt: null,
      takenBy: null,
      takenById: null,
      setAsideUntil: null,
      setAsideReason: null,
      setAsideBy: null,
      clearedAt: null,
      closedAt: null,
      closedBy: null,
      closedCause: null,
      previousId: last?.id ?? null,
      createdAt: now,
    };
    await this.alerts.insert(transaction, alert);
    await this.teller.tell(transaction, alert, now);
    await this.tell(transaction, alert);
    return alert;
  }

  private async keep(transaction: Transaction, alert: AlertRecord): Promise<AlertRecord> {
    const kept = await this.alerts.update(transaction, alert);
    if (kept.state === 'cleared') await this.teller.tellOutcome(transaction, kept, 'cleared');
    await this.tell(transaction, kept);
    return kept;
  }

  private async tell(transaction: Transaction, alert: AlertRecord): Promise<void> {
    const { id, version, terminalCode } = alert;
    await this.changes.append(transaction, { kind: 'alert', objectId: id, version, terminalCode });
  }
}

/** An alert after something that its state allows. */
function after(alert: AlertRecord, event: AlertEvent): AlertRecord {
  const standing = alertAfter({ state: alert.state, taken: alert.takenAt !== null }, event);
  if (!standing.ok) throw new Error(`alert ${alert.id} is ${alert.state}: no ${event}`);
  return { ...alert, state: standing.value.state };
}

/** What an alert says, from a finding. */
function wordsOf(turn: WatchedTurn, finding: Finding) {
  const { priority, text, action, actor, byWhen, lines } = finding;
  return { subject: subjectWords(turn.facts), priority, text, action, actor, byWhen, lines };
}
