import { createHash } from 'node:crypto';
import { Injectable, Logger } from '@nestjs/common';
import { formatInstant, type Instant, type MessageChannel, silenceWords } from '@stubpost/shared';
import { Config } from '../config/config';
import { Reader } from '../database/reader';
import { MessageChannels } from '../messages/message-channels';
import { SweepHeartbeat } from './sweep-heartbeat';

/** Somebody who is told that the sweep is silent. */
interface Recipient {
  id: string;
  name: string;
  email: string;
  phone: string | null;
}

/** A silence that people are being told of, with those who know. */
interface Silence {
  since: Instant;
  told: Set<string>;
}

/**
 * Sees whether the alert sweep is silent, and tells supervisors and administrators. It shares nothing with what it
 * watches: a timer of its own, no unit of work, the channels directly, and people it has read while all was well.
 */
@Injectable()
export class SweepWatchdog {
  private readonly logger = new Logger('watchdog');
  private recipients: readonly Recipient[] = [];
  private silence: Silence | null = null;

  constructor(
    private readonly heartbeat: SweepHeartbeat,
    private readonly channels: MessageChannels,
    private readonly reader: Reader,
    private readonly config: Config,
  ) {}

  /** One look. While the sweep is silent, each look tries those again who could not be reached. */
  async look(): Promise<void> {
    if (this.heartbeat.isWell()) {
      await this.readRecipients();
      if (this.silence !== null) await this.tellEnd(this.silence);
      return;
    }
    if (this.silence === null) {
      this.silence = { since: this.heartbeat.silentSince, told: new Set() };
      this.logger.error(`no alert sweep since ${formatInstant(this.silence.since)}`);
      if (this.recipients.length === 0) await this.readRecipients();
    }
    await this.tell(this.silence);
  }

  private async tellEnd(silence: Silence): Promise<void> {
    this.silence = null;
    this.logger.log(`alert sweeps again; there was none from ${formatInstant(silence.since)} on`);
    const knowing = this.recipients.filter(
      ({ id }) => silence.told.has(`${id} e-mail`) || silence.told.has(`${id} sms`),
    );
    const { since } = silence;
    await Promise.all(knowing.map((person) => this.reach(person, { since, isOver: true, told: new Set() })));
  }

  private async tell(silence: Silence): Promise<void> {
    await Promise.all(this.recipients.map((person) => this.reach(person, { ...silence, isOver: false })));
  }

  private async reach(person: Recipient, news: Silence & { isOver: boolean }): Promise<void> {
    const { since, isOver, told } = news;
    const words = silenceWords({ since, isOver, pageUrl: `${this.config.publicUrl}/alerts` });
    const ways: [MessageChannel, string | null, string][] = [
      ['e-mail', person.email, words.text],
      ['sms', person.phone, words.sms],
    ];
    for (const [channel, address, text] of ways) {
      const key = `${person.id} ${channel}`;
      if (address === null || told.has(key)) continue;
      const id = idOf(`${since} ${isOver} ${key}`);
      try {
        await this.channels
          .by(channel)
          .send({ id, address, name: person.name, subject: words.subject, text, thread: `sweep-${since}` });
        told.add(key);
      } catch (error) {
        const reason = error instanceof Error ? error.message : String(error);
        this.logger.error(`${person.name} could not be told by ${channel} of the silent sweep: ${reason}`);
      }
    }
  }

  private async readRecipients(): Promise<void> {
    try {
      this.recipients = await this.reader.query<Recipient>(
        `SELECT DISTINCT p.id, p.name, p.email, p.phone FROM person p JOIN person_role r ON r.person_id = p.id
         WHERE p.active = ? AND r.role IN ('supervisor', 'administrator') ORDER BY p.name, p.id`,
        [true],
      );
    } catch (error) {
      this.logger.error(`the people to be told could not be read: ${String(error)}`);
    }
  }
}

const idOf = (text: string): string =>
  createHash('sha256').update(`sweep ${text}`).digest('hex').slice(0, 32);
