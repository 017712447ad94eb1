import { Body, Controller, Get, Param, Put } from '@nestjs/common';
import { type PutSetRequest, type WireSet, putSetSchema, textSchema } from '@stubpost/shared';
import { Clock } from '../common/clock';
import { Permit } from '../common/decorators';
import { ZodPipe } from '../common/zod.pipe';
import { SetsService } from './sets.service';

const labelSchema = textSchema(20);

@Controller('api/sets')
export class SetsController {
  constructor(
    private readonly sets: SetsService,
    private readonly clock: Clock,
  ) {}

  @Get()
  @Permit('sets.read')
  list(): Promise<WireSet[]> {
    return this.sets.list();
  }

  @Put(':label')
  @Permit('sets.edit')
  put(
    @Param('label', new ZodPipe(labelSchema)) label: string,
    @Body(new ZodPipe(putSetSchema)) request: PutSetRequest,
  ): Promise<WireSet> {
    return this.sets.put({ label, request, now: this.clock.now() });
  }
}
