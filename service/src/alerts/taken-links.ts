import { Injectable } from '@nestjs/common';
import { formatInstant, type Instant, type PersonAccess, type Role, type WireTaking } from '@stubpost/shared';
import { LinkTokens } from '../auth/link-tokens';
import { Refusal } from '../common/refusal';
import { Reader } from '../database/reader';
import { AlertDesk } from './alert-desk';
import type { AlertRecord } from './alert-record';
import { AlertReadModel } from './alert.read-model';

interface LinkRow {
  token_hash: string;
  alert_id: string;
  person_id: string;
  expires_at: number;
  name: string;
}

/** The links in messages: by one, a person takes an alert without signing in, once, for a limited time. */
@Injectable()
export class TakenLinks {
  constructor(
    private readonly tokens: LinkTokens,
    private readonly reader: Reader,
    private readonly alerts: AlertReadModel,
    private readonly desk: AlertDesk,
  ) {}

  /** What a link is about. Changes nothing: programs that look through mail open links too. */
  async look(token: string, now: Instant): Promise<WireTaking> {
    const link = await this.require(token, now);
    return this.wireOf(link, await this.alertOf(link));
  }

  /** Takes the alert as the person the link was sent to, and uses the link up, both or neither. */
  async take(token: string, now: Instant): Promise<WireTaking> {
    const link = await this.require(token, now);
    const person = await this.personOf(link);
    const alert = await this.desk.take({ alertId: link.alert_id, person, now }, async (transaction) => {
      const used = await transaction.execute(
        'UPDATE taken_link SET used_at = ? WHERE token_hash = ? AND used_at IS NULL',
        [now, link.token_hash],
      );
      if (used === 0) throw unknownLink();
    });
    return this.wireOf(link, alert);
  }

  private async require(token: string, now: Instant): Promise<LinkRow> {
    const [link] = await this.reader.query<LinkRow>(
      `SELECT l.token_hash, l.alert_id, l.person_id, l.expires_at, p.name
       FROM taken_link l JOIN person p ON p.id = l.person_id
       WHERE l.token_hash = ? AND l.used_at IS NULL AND l.expires_at > ? AND p.active = ?`,
      [this.tokens.hashOf(token), now, true],
    );
    if (link === undefined) throw unknownLink();
    return link;
  }

  private async alertOf(link: LinkRow): Promise<AlertRecord> {
    const alert = await this.alerts.find(link.alert_id);
    if (alert === null || alert.state === 'closed') throw unknownLink();
    return alert;
  }

  private async personOf(link: LinkRow): Promise<PersonAccess & { name: string }> {
    const roles = await this.reader.query<{ role: Role; terminal: string }>(
      'SELECT role, terminal FROM person_role WHERE person_id = ?',
      [link.person_id],
    );
    return { id: link.person_id, name: link.name, roles };
  }

  private async wireOf(link: LinkRow, alert: AlertRecord): Promise<WireTaking> {
    const [terminal] = await this.reader.query<{ name: string; zone: string }>(
      'SELECT name, zone FROM terminal WHERE code = ?',
      [alert.terminalCode],
    );
    return {
      name: link.name,
      terminal: terminal?.name ?? alert.terminalCode,
      zone: terminal?.zone ?? 'UTC',
      priority: alert.priority,
      subject: alert.subject,
      text: alert.text,
      action: alert.action,
      raisedAt: formatInstant(alert.raisedAt),
      clearedAt: alert.clearedAt === null ? null : formatInstant(alert.clearedAt),
      takenBy: alert.takenBy,
      takenAt: alert.takenAt === null ? null : formatInstant(alert.takenAt),
      expiresAt: formatInstant(Number(link.expires_at)),
    };
  }
}

function unknownLink(): Refusal {
  return new Refusal({ code: 'alert.link_unknown', message: 'this link was used, has run out or never was' });
}
