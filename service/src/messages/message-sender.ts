import { randomUUID } from 'node:crypto';
import { Injectable, Logger } from '@nestjs/common';
import {
  addSeconds,
  type Instant,
  MESSAGE_CHANNELS,
  type MessageChannel,
  type SendOutcome,
} from '@stubpost/shared';
import { LinkTokens } from '../auth/link-tokens';
import { Reader } from '../database/reader';
import { type Transaction, UnitOfWork } from '../database/unit-of-work';
import { MessageChannels } from './message-channels';
import { type Sendable, TOKEN_MARK } from './outgoing';
import { giveUpAfterSeconds, pauseAfter } from './send-again';

interface MessageRecord {
  id: string;
  channel: MessageChannel;
  address: string;
  name: string;
  alert_id: string | null;
  subject: string;
  body: string;
  link_purpose: string | null;
  tries: number;
  created_at: number;
}

/** So many messages of one way are taken up in one run. */
const mostInARun = 50;

/**
 * Sends what lies in the outbox. A message is claimed in one transaction, sent outside of any, and its outcome written
 * in another. Where a run of the service ended in between, the next one finds the claim: it asks the other side
 * whether the message had arrived, or where that cannot be asked sends the very same message again.
 */
@Injectable()
export class MessageSender {
  private readonly logger = new Logger('messages');
  private readonly runId = randomUUID();
  private isStopping = false;

  constructor(
    private readonly reader: Reader,
    private readonly unitOfWork: UnitOfWork,
    private readonly channels: MessageChannels,
    private readonly tokens: LinkTokens,
  ) {}

  /** One run as of a moment: what was cut off first, then what is due. The ways do not wait for one another. */
  async run(now: Instant): Promise<void> {
    await Promise.all(MESSAGE_CHANNELS.map((channel) => this.runChannel(channel, now)));
  }

  /** Ends after the message that is under way. */
  stop(): void {
    this.isStopping = true;
  }

  private async runChannel(channel: MessageChannel, now: Instant): Promise<void> {
    for (const message of await this.cutOff(channel)) {
      if (this.isStopping) return;
      await this.resume(message, now);
    }
    for (const message of await this.due(channel, now)) {
      if (this.isStopping) return;
      if (await this.claim(message)) await this.send({ ...message, tries: message.tries + 1 }, now);
    }
  }

  private due(channel: MessageChannel, now: Instant): Promise<MessageRecord[]> {
    return this.reader.query<MessageRecord>(
      `SELECT * FROM message WHERE state = 'waiting' AND channel = ? AND next_at <= ?
       ORDER BY next_at, created_at, id LIMIT ${mostInARun}`,
      [channel, now],
    );
  }

  private cutOff(channel: MessageChannel): Promise<MessageRecord[]> {
    return this.reader.query<MessageRecord>(
      `SELECT * FROM message WHERE state = 'claimed' AND channel = ? AND claimed_by <> ? ORDER BY created_at, id`,
      [channel, this.runId],
    );
  }

  /** False when somebody else has it. */
  private async claim({ id }: MessageRecord): Promise<boolean> {
    const claimed = await this.unitOfWork.run((transaction) =>
      transaction.execute(
        `UPDATE message SET state = 'claimed', claimed_by = ?, tries = tries + 1 WHERE id = ? AND state = 'waiting'`,
        [this.runId, id],
      ),
    );
    return claimed === 1;
  }

  private async send(message: MessageRecord, now: Instant): Promise<void> {
    let answer: string;
    try {
      answer = await this.channels.by(message.channel).send(this.filledIn(message));
    } catch (error) {
      await this.failed(message, wordsOf(error), now);
      return;
    }
    await this.sent(message, 'accepted', answer, now);
  }

  private async resume(message: MessageRecord, now: Instant): Promise<void> {
    const accepted = await this.channels
      .by(message.channel)
      .wasAccepted(this.filledIn(message))
      .catch(() => undefined);
    // No answer leaves it claimed: the next run asks again, for a second message would be worse than a late one.
    if (accepted === undefined) return;
    if (accepted === true) return this.sent(message, 'found-accepted', 'sent before the service ended', now);
    await this.unitOfWork.run(async (transaction) => {
      await transaction.execute(`UPDATE message SET state = 'waiting', next_at = ? WHERE id = ?`, [
        now,
        message.id,
      ]);
      await this.note(transaction, message, { outcome: 'cut-off', detail: 'the service ended', now });
    });
  }

  private sent(message: MessageRecord, outcome: SendOutcome, detail: string, now: Instant): Promise<void> {
    return this.unitOfWork.run(async (transaction) => {
      await transaction.execute(
        `UPDATE message SET state = 'sent', sent_at = ?, next_at = NULL WHERE id = ? AND state = 'claimed'`,
        [now, message.id],
      );
      await this.note(transaction, message, { outcome, detail, now });
    });
  }

  private async failed(message: MessageRecord, detail: string, now: Instant): Promise<void> {
    const isOver = now >= addSeconds(Number(message.created_at), giveUpAfterSeconds);
    const words = `message ${message.id} by ${message.channel}, try ${message.tries}: ${detail}`;
    if (isOver) this.logger.error(`given up: ${words}`);
    else this.logger.warn(words);
    await this.unitOfWork.run(async (transaction) => {
      await transaction.execute('UPDATE message SET state = ?, next_at = ? WHERE id = ?', [
        isOver ? 'given-up' : 'waiting',
        isOver ? null : addSeconds(now, pauseAfter(message.tries)),
        message.id,
      ]);
      await this.note(transaction, message, { outcome: 'failed', detail, now });
    });
  }

  private async note(
    transaction: Transaction,
    { id }: MessageRecord,
    { outcome, detail, now }: { outcome: SendOutcome; detail: string; now: Instant },
  ): Promise<void> {
    await transaction.execute(
      `INSERT INTO message_try (message_id, number, outcome, detail, tried_at)
       SELECT ?, COUNT(*) + 1, ?, ?, ? FROM message_try WHERE message_id = ?`,
      [id, outcome, detail.slice(0, 300), now, id],
    );
  }

  private filledIn(message: MessageRecord): Sendable {
    const { id, address, name, subject, body, link_purpose: purpose, alert_id: thread } = message;
    const text = purpose === null ? body : body.replace(TOKEN_MARK, this.tokens.tokenFor(purpose));
    return { id, address, name, subject, text, thread };
  }
}

const wordsOf = (error: unknown): string => (error instanceof Error ? error.message : String(error));
