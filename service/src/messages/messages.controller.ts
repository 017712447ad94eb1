import { Controller, Get } from '@nestjs/common';
import type { WireMessageBoxes } from '@stubpost/shared';
import { Permit } from '../common/decorators';
import { MessagesReadModel } from './messages.read-model';

/** What went out, and where nothing real is set up, the boxes it ended in. */
@Controller('api/messages')
export class MessagesController {
  constructor(private readonly readModel: MessagesReadModel) {}

  @Get()
  @Permit('messages.read')
  list(): Promise<WireMessageBoxes> {
    return this.readModel.boxesAndMessages();
  }
}
