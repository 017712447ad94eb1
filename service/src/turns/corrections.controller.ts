import { Controller, Get, Query } from '@nestjs/common';
import { type CorrectionsQuery, type ListedCorrection, correctionsQuerySchema } from '@stubpost/shared';
import { Permit } from '../common/decorators';
import { ZodPipe } from '../common/zod.pipe';
import { TerminalsReadModel } from '../terminals/terminals.read-model';
import { CorrectionsReadModel } from './corrections.read-model';

@Controller('api/records/corrections')
export class CorrectionsController {
  constructor(
    private readonly corrections: CorrectionsReadModel,
    private readonly terminals: TerminalsReadModel,
  ) {}

  @Get()
  @Permit('corrections.read', { terminal: 'query.terminal' })
  async list(
    @Query(new ZodPipe(correctionsQuerySchema)) query: CorrectionsQuery,
  ): Promise<ListedCorrection[]> {
    await this.terminals.require(query.terminal);
    return this.corrections.find(query);
  }
}
