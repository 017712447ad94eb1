import { Module } from '@nestjs/common';
import { AuthModule } from '../auth/auth.module';
import { BoxFolder } from './box-folder';
import { LocalBoxes } from './local-boxes';
import { MailChannel } from './mail.channel';
import { MessageChannels } from './message-channels';
import { MessageSender } from './message-sender';
import { MessageSendingJob } from './message-sending.job';
import { MessagesController } from './messages.controller';
import { MessagesReadModel } from './messages.read-model';
import { Outbox } from './outbox';
import { SmsChannel } from './sms.channel';

/** Messages that leave the house: the outbox, who sends it, the ways out, and the local boxes. */
@Module({
  imports: [AuthModule],
  controllers: [MessagesController],
  providers: [
    BoxFolder,
    LocalBoxes,
    MailChannel,
    MessageChannels,
    MessageSender,
    MessageSendingJob,
    MessagesReadModel,
    Outbox,
    SmsChannel,
  ],
  exports: [MessageChannels, Outbox],
})
export class MessagesModule {}
