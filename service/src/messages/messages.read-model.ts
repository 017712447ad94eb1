import { Injectable } from '@nestjs/common';
import {
  formatInstant,
  type MessageChannel,
  type MessageState,
  type SendOutcome,
  type WireMessage,
  type WireMessageBoxes,
} from '@stubpost/shared';
import { Reader } from '../database/reader';
import { BoxFolder } from './box-folder';
import { LocalBoxes } from './local-boxes';

/** So many messages are shown, the newest first. */
const mostShown = 200;

interface RawMessage {
  id: string;
  channel: MessageChannel;
  address: string;
  name: string;
  terminal_code: string | null;
  alert_id: string | null;
  subject: string;
  state: MessageState;
  created_at: number;
  sent_at: number | null;
  next_at: number | null;
}

interface RawTry {
  message_id: string;
  outcome: SendOutcome;
  detail: string;
  tried_at: number;
}

/** Outgoing messages and local boxes as the administrator's page shows them. */
@Injectable()
export class MessagesReadModel {
  constructor(
    private readonly reader: Reader,
    private readonly folder: BoxFolder,
    private readonly boxes: LocalBoxes,
  ) {}

  async boxesAndMessages(): Promise<WireMessageBoxes> {
    const messages = await this.messages();
    const items = (await this.folder.list()).slice(0, mostShown);
    return {
      local: this.boxes.channels,
      messages,
      items: items.map(({ id, channel, to, subject, text, receivedAt }) => ({
        ...{ id, channel, to, subject, text },
        receivedAt: formatInstant(receivedAt),
      })),
    };
  }

  private async messages(): Promise<WireMessage[]> {
    const rows = await this.reader.query<RawMessage>(
      `SELECT * FROM message ORDER BY created_at DESC, id LIMIT ${mostShown}`,
    );
    const tries = await this.reader.query<RawTry>(
      `SELECT t.* FROM message_try t JOIN (SELECT id FROM message ORDER BY created_at DESC, id LIMIT ${mostShown}) m
       ON m.id = t.message_id ORDER BY t.number`,
    );
    const byMessage = grouped(tries);
    return rows.map((row) => wireMessageOf(row, byMessage.get(row.id) ?? []));
  }
}

function grouped(tries: readonly RawTry[]): Map<string, RawTry[]> {
  const byMessage = new Map<string, RawTry[]>();
  for (const each of tries) byMessage.set(each.message_id, [...(byMessage.get(each.message_id) ?? []), each]);
  return byMessage;
}

const instantOf = (value: number | null): string | null =>
  value === null ? null : formatInstant(Number(value));

function wireMessageOf(row: RawMessage, tries: readonly RawTry[]): WireMessage {
  return {
    id: row.id,
    channel: row.channel,
    to: row.address,
    name: row.name,
    terminal: row.terminal_code,
    alertId: row.alert_id,
    subject: row.subject,
    state: row.state,
    createdAt: formatInstant(Number(row.created_at)),
    sentAt: instantOf(row.sent_at),
    nextAt: instantOf(row.next_at),
    tries: tries.map(({ tried_at: triedAt, outcome, detail }) => ({
      at: formatInstant(Number(triedAt)),
      outcome,
      detail,
    })),
  };
}
