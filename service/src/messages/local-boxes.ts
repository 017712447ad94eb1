import { Injectable, type OnApplicationBootstrap, type OnModuleDestroy } from '@nestjs/common';
import { MESSAGE_CHANNELS, type MessageChannel } from '@stubpost/shared';
import { Clock } from '../common/clock';
import { Config, type SmsAccount } from '../config/config';
import { BoxFolder } from './box-folder';
import type { FakeServer } from './fake-server';
import { startFakeSms } from './fake-sms-server';
import { startFakeSmtp } from './fake-smtp-server';

/** Names of the local account; they open nothing. */
const localAccount = { account: 'AClocal', token: 'local', from: '+15550100000' };

/**
 * Stand-ins for the mail server and the provider of text messages, for as long as none is set up: they listen on
 * loopback ports of the system's choosing and keep what they get in the data folder, for an administrator to read.
 */
@Injectable()
export class LocalBoxes implements OnApplicationBootstrap, OnModuleDestroy {
  private readonly servers = new Map<MessageChannel, FakeServer>();
  private readonly ports = new Map<MessageChannel, number>();

  constructor(
    private readonly config: Config,
    private readonly folder: BoxFolder,
    private readonly clock: Clock,
  ) {}

  /** Ways that end in a local box. */
  get channels(): MessageChannel[] {
    const isLocal = { 'e-mail': this.config.smtpUrl === null, sms: this.config.sms === null };
    return MESSAGE_CHANNELS.filter((channel) => isLocal[channel]);
  }

  async onApplicationBootstrap(): Promise<void> {
    await this.open();
  }

  async onModuleDestroy(): Promise<void> {
    await this.close();
  }

  /** Starts what is not running, on the port it had before. */
  async open(): Promise<void> {
    for (const channel of this.channels) {
      if (this.servers.has(channel)) continue;
      const start = channel === 'sms' ? startFakeSms : startFakeSmtp;
      const server = await start({
        port: this.ports.get(channel) ?? 0,
        keep: (item) => this.folder.keep({ ...item, receivedAt: this.clock.now() }),
        list: () => this.folder.list(),
      });
      this.servers.set(channel, server);
      this.ports.set(channel, server.port);
    }
  }

  /** Stops listening; whoever sends meanwhile gets no answer. */
  async close(): Promise<void> {
    const servers = [...this.servers.values()];
    this.servers.clear();
    await Promise.all(servers.map((server) => server.close()));
  }

  smtpUrl(): string {
    return `smtp://127.0.0.1:${this.ports.get('e-mail') ?? 0}?ignoreTLS=true`;
  }

  smsAccount(): SmsAccount {
    return { ...localAccount, apiUrl: `http://127.0.0.1:${this.ports.get('sms') ?? 0}` };
  }
}
