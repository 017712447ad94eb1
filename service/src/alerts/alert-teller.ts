import { Injectable } from '@nestjs/common';
import {
  addSeconds,
  alertMail,
  type AlertMessageFacts,
  alertSms,
  type Instant,
  type MessageChannel,
  outcomeMail,
  type Told,
  whoIsTold,
} from '@stubpost/shared';
import { LinkTokens } from '../auth/link-tokens';
import { Clock } from '../common/clock';
import { Config } from '../config/config';
import type { Transaction } from '../database/unit-of-work';
import { DutyRosters, type ReachablePerson, type ReachableRoster } from '../duty/duty-rosters';
import { Outbox } from '../messages/outbox';
import type { AlertRecord } from './alert-record';
import { takingPurpose } from './taking-purpose';

/** A link works this long. Our choice: an alert is over by then, one way or the other. */
const linkSeconds = 2 * 60 * 60;
/** What is written down later than this is the past: nobody is sent a message about it. Our choice. */
const longestLagSeconds = 10 * 60;

/** Occasion of the messages that somebody is to act on. */
const TOLD = 'told';

/** A message that is due to somebody. */
interface Delivery {
  told: Told;
  person: ReachablePerson;
  channel: MessageChannel;
  address: string;
}

const becauseWords: Readonly<Record<Told['rung'], string>> = {
  desk: 'on the desk',
  deputy: 'deputy of the desk',
  supervisor: 'a supervisor',
};

/** Leaves messages about alerts in the outbox, in the transaction of what they tell. Twice the same adds nothing. */
@Injectable()
export class AlertTeller {
  constructor(
    private readonly rosters: DutyRosters,
    private readonly outbox: Outbox,
    private readonly tokens: LinkTokens,
    private readonly config: Config,
    private readonly clock: Clock,
  ) {}

  /** Tells everybody who is to know of an alert by now and was not told. */
  async tell(transaction: Transaction, alert: AlertRecord, now: Instant): Promise<void> {
    if (this.isPast(now)) return;
    const roster = await this.rosters.find(alert.terminalCode);
    if (roster === null) return;
    const before = await this.toldBefore(transaction, alert.id);
    const due = deliveriesOf(alert, roster, now);
    const names = [...new Set(due.map(({ person }) => person.name))];
    for (const delivery of due) {
      if (before.has(keyOf(delivery))) continue;
      await this.put(transaction, { alert, roster, delivery, names, now });
    }
  }

  /** Who is still to be told by now, without writing anything: what the sweep asks. */
  isTellingDue(
    alert: AlertRecord,
    roster: ReachableRoster,
    before: ReadonlySet<string>,
    now: Instant,
  ): boolean {
    return deliveriesOf(alert, roster, now).some((delivery) => !before.has(keyOf(delivery)));
  }

  /** Tells those who were written to what became of the alert, in the same thread; not the one who took it. */
  async tellOutcome(transaction: Transaction, alert: AlertRecord, kind: 'taken' | 'cleared'): Promise<void> {
    const at = kind === 'taken' ? alert.takenAt : alert.clearedAt;
    if (at === null || this.isPast(at)) return;
    const told = await transaction.query<
      { person_id: string; name: string; address: string; subject: string }[]
    >(
      `SELECT person_id, name, address, subject FROM message
       WHERE alert_id = ? AND occasion = ? AND channel = 'e-mail' ORDER BY created_at, id`,
      [alert.id, TOLD],
    );
    if (told.length === 0) return;
    const zone = (await this.rosters.find(alert.terminalCode))?.zone ?? 'UTC';
    for (const { person_id: id, name, address, subject } of told) {
      if (kind === 'taken' && id === alert.takenById) continue;
      const words = outcomeMail({
        ...{ firstSubject: subject, kind, at, zone, by: alert.takenBy },
        pageUrl: this.pageOf(alert),
      });
      await this.outbox.put(
        transaction,
        {
          channel: 'e-mail',
          address,
          person: { id, name },
          terminalCode: alert.terminalCode,
          alertId: alert.id,
          occasion: kind,
          instance: String(at),
          subject: words.subject,
          body: words.text,
          linkPurpose: null,
        },
        at,
      );
    }
  }

  private async put(
    transaction: Transaction,
    news: {
      alert: AlertRecord;
      roster: ReachableRoster;
      delivery: Delivery;
      names: readonly string[];
      now: Instant;
    },
  ): Promise<void> {
    const { alert, roster, now } = news;
    const { person, channel, address, told } = news.delivery;
    const purpose = takingPurpose(alert.id, person.id);
    const facts: AlertMessageFacts = {
      alert,
      terminal: { name: roster.terminal.name, zone: roster.zone },
      because: becauseWords[told.rung],
      others: news.names.filter((name) => name !== person.name),
      pageUrl: this.pageOf(alert),
      takenUrl: `${this.config.publicUrl}/t/${this.outbox.tokenMark}`,
    };
    const mail = alertMail(facts);
    await transaction.execute(
      `INSERT INTO taken_link (token_hash, alert_id, person_id, created_at, expires_at, used_at)
       VALUES (?, ?, ?, ?, ?, NULL) ON CONFLICT (token_hash) DO NOTHING`,
      [
        this.tokens.hashOf(this.tokens.tokenFor(purpose)),
        alert.id,
        person.id,
        now,
        addSeconds(now, linkSeconds),
      ],
    );
    await this.outbox.put(
      transaction,
      {
        channel,
        address,
        person: { id: person.id, name: person.name },
        terminalCode: alert.terminalCode,
        alertId: alert.id,
        occasion: TOLD,
        subject: mail.subject,
        body: channel === 'sms' ? alertSms(facts) : mail.text,
        linkPurpose: purpose,
      },
      now,
    );
  }

  private async toldBefore(transaction: Transaction, alertId: string): Promise<Set<string>> {
    const rows = await transaction.query<{ person_id: string; channel: string }[]>(
      'SELECT person_id, channel FROM message WHERE alert_id = ? AND occasion = ?',
      [alertId, TOLD],
    );
    return new Set(rows.map((row) => `${row.person_id} ${row.channel}`));
  }

  private pageOf({ turnId }: AlertRecord): string {
    return turnId === null ? `${this.config.publicUrl}/alerts` : `${this.config.publicUrl}/turns/${turnId}`;
  }

  /** Weeks that are written down afterwards raise alerts as they did; they must not wake anybody. */
  private isPast(at: Instant): boolean {
    return addSeconds(at, longestLagSeconds) < this.clock.now();
  }
}

const keyOf = ({ person, channel }: Delivery): string => `${person.id} ${channel}`;

/** What is due by now, each once: somebody without a telephone gets a mail where a text message was to go. */
function deliveriesOf(alert: AlertRecord, roster: ReachableRoster, now: Instant): Delivery[] {
  const due = new Map<string, Delivery>();
  for (const told of whoIsTold(alert, roster, now)) {
    const person = roster.people.find(({ id }) => id === told.personId);
    if (person === undefined) continue;
    const bySms = told.channel === 'sms' && person.phone !== null;
    const delivery: Delivery = {
      told,
      person,
      channel: bySms ? 'sms' : 'e-mail',
      address: bySms ? (person.phone ?? '') : person.email,
    };
    if (!due.has(keyOf(delivery))) due.set(keyOf(delivery), delivery);
  }
  return [...due.values()];
}
