import { Injectable } from '@nestjs/common';
import type { Twilio } from 'twilio';
import type RequestClient from 'twilio/lib/base/RequestClient';
import { Config, type SmsAccount } from '../config/config';
import { LocalBoxes } from './local-boxes';
import type { Channel } from './channel';
import type { Sendable } from './outgoing';

/** A provider that does not answer must not hold the other messages up. */
const patienceMilliseconds = 10_000;
/** So many of the messages to a number are looked through for one whose sending was cut off. */
const lookBack = 50;

/** Text messages through the provider's client, to the provider or to the local box. */
@Injectable()
export class SmsChannel implements Channel {
  private client: { apiUrl: string | null; twilio: Promise<Twilio> } | undefined;

  constructor(
    private readonly config: Config,
    private readonly boxes: LocalBoxes,
  ) {}

  async send({ address, text }: Sendable): Promise<string> {
    const account = this.account();
    const client = await this.clientOf(account);
    const { sid, status } = await client.messages.create({ to: address, from: account.from, body: text });
    return `${status} ${sid}`;
  }

  /** Each message has a link or a time of its own, so the same words to the same number are the same message. */
  async wasAccepted({ address, text }: Sendable): Promise<boolean> {
    const client = await this.clientOf(this.account());
    const sent = await client.messages.list({ to: address, limit: lookBack });
    return sent.some(({ body }) => body === text);
  }

  private account(): SmsAccount {
    return this.config.sms ?? this.boxes.smsAccount();
  }

  private clientOf(account: SmsAccount): Promise<Twilio> {
    if (this.client?.apiUrl !== account.apiUrl) {
      this.client = { apiUrl: account.apiUrl, twilio: makeClient(account) };
    }
    return (this.client as { twilio: Promise<Twilio> }).twilio;
  }
}

/** The client is large: it is loaded when the first text message goes out, not at every start. */
async function makeClient({ account, token, apiUrl }: SmsAccount): Promise<Twilio> {
  const { default: provider } = await import('twilio');
  class MovedClient extends provider.RequestClient {
    override request<Data>(options: RequestClient.RequestOptions<Data>) {
      return super.request<Data>({ ...options, uri: movedTo(apiUrl, options.uri) });
    }
  }
  return new provider.Twilio(account, token, {
    httpClient: new MovedClient({ timeout: patienceMilliseconds }),
  });
}

/** The address at another origin; the provider's own where none is given. */
function movedTo(apiUrl: string | null, uri: string): string {
  if (apiUrl === null) return uri;
  const { pathname, search } = new URL(uri);
  return `${apiUrl.replace(/\/+$/, '')}${pathname}${search}`;
}
