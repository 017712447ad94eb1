import { Injectable } from '@nestjs/common';
import type { MessageChannel } from '@stubpost/shared';
import type { Channel } from './channel';
import { MailChannel } from './mail.channel';
import { SmsChannel } from './sms.channel';

/** The ways out by name. */
@Injectable()
export class MessageChannels {
  constructor(
    private readonly mail: MailChannel,
    private readonly sms: SmsChannel,
  ) {}

  by(channel: MessageChannel): Channel {
    return channel === 'sms' ? this.sms : this.mail;
  }
}
