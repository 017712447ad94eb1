import { Module } from '@nestjs/common';
import { TerminalsController } from './terminals.controller';
import { TerminalsReadModel } from './terminals.read-model';
import { TerminalsRepository } from './terminals.repository';
import { TerminalsService } from './terminals.service';

/** Terminals, their tracks and their thresholds. */
@Module({
  controllers: [TerminalsController],
  providers: [TerminalsReadModel, TerminalsRepository, TerminalsService],
  exports: [TerminalsReadModel, TerminalsService],
})
export class TerminalsModule {}
