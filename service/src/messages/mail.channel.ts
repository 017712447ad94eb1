import { Injectable, type OnModuleDestroy } from '@nestjs/common';
import { createTransport, type Transporter } from 'nodemailer';
import { Config } from '../config/config';
import { LocalBoxes } from './local-boxes';
import { mailHtml } from './mail-html';
import type { Channel } from './channel';
import type { Sendable } from './outgoing';

/** A server that does not answer must not hold the other messages up. */
const patienceMilliseconds = 10_000;

/** E-mail by SMTP, to the configured server or to the local box. */
@Injectable()
export class MailChannel implements Channel, OnModuleDestroy {
  private transport: { url: string; transporter: Transporter } | undefined;

  constructor(
    private readonly config: Config,
    private readonly boxes: LocalBoxes,
  ) {}

  async send(message: Sendable): Promise<string> {
    const domain = this.config.mailFrom.split('@').at(-1) ?? 'stubpost.invalid';
    const root = message.thread === null ? null : `<alert-${message.thread}@${domain}>`;
    const answer = (await this.transporter().sendMail({
      from: { name: 'Stubpost', address: this.config.mailFrom },
      to: { name: message.name, address: message.address },
      subject: message.subject,
      text: message.text,
      html: mailHtml(message),
      messageId: `<${message.id}@${domain}>`,
      headers: { 'Auto-Submitted': 'auto-generated' },
      ...(root === null ? {} : { inReplyTo: root, references: [root] }),
      // Nothing in a message is a file name or an address to be fetched.
      disableFileAccess: true,
      disableUrlAccess: true,
    })) as { response?: string };
    return answer.response ?? 'accepted';
  }

  /** Mail servers cannot be asked; the same Message-ID lets the receiver see that it is one message. */
  wasAccepted(): Promise<null> {
    return Promise.resolve(null);
  }

  onModuleDestroy(): void {
    this.transport?.transporter.close();
  }

  private transporter(): Transporter {
    const url = this.config.smtpUrl ?? this.boxes.smtpUrl();
    if (this.transport?.url === url) return this.transport.transporter;
    this.transport?.transporter.close();
    const options = {
      url,
      connectionTimeout: patienceMilliseconds,
      greetingTimeout: patienceMilliseconds,
      socketTimeout: patienceMilliseconds,
    };
    const transporter = createTransport(options);
    this.transport = { url, transporter };
    return transporter;
  }
}
