import {
  Body,
  Controller,
  Get,
  HttpCode,
  Param,
  Post,
  Query,
  UploadedFile,
  UseInterceptors,
} from '@nestjs/common';
import { FileInterceptor } from '@nestjs/platform-express';
import {
  type ActivationRequest,
  activationSchema,
  type DerivedTurnsQuery,
  derivedTurnsQuerySchema,
  type DifferenceQuery,
  differenceQuerySchema,
  parseRouteTypes,
  railRouteTypes,
  type UploadFields,
  uploadFieldsSchema,
  type UploadReceipt,
  type WireDerivedTurn,
  type WireTimetable,
  type WireTimetableDifference,
  type WireTimetableHead,
} from '@stubpost/shared';
import { CurrentPerson, Permit } from '../common/decorators';
import type { CurrentPersonFacts } from '../common/signed-in';
import { ZodPipe } from '../common/zod.pipe';
import { TimetableActivations } from './timetable-activations.service';
import { TimetableImports } from './timetable-imports.service';
import { TimetableTurns } from './timetable-turns.service';
import { TimetablesReadModel } from './timetables.read-model';
import { fileMissing, UploadRefusals } from './upload.interceptor';

/** Imported timetables. */
@Controller('api/timetables')
export class TimetablesController {
  constructor(
    private readonly readModel: TimetablesReadModel,
    private readonly imports: TimetableImports,
    private readonly turns: TimetableTurns,
    private readonly activations: TimetableActivations,
  ) {}

  @Get()
  @Permit('timetables.read')
  list(): Promise<WireTimetableHead[]> {
    return this.readModel.all();
  }

  @Post()
  @HttpCode(202)
  @Permit('timetables.import')
  @UseInterceptors(UploadRefusals, FileInterceptor('file'))
  async bringIn(
    @UploadedFile() file: Express.Multer.File | undefined,
    @Body(new ZodPipe(uploadFieldsSchema)) { routeTypes }: UploadFields,
    @CurrentPerson() person: CurrentPersonFacts,
  ): Promise<UploadReceipt> {
    if (file === undefined) throw fileMissing();
    const types = routeTypes === undefined ? null : parseRouteTypes(routeTypes);
    const id = await this.imports.start(file, types ?? railRouteTypes, person.name);
    return { id, state: 'reading' };
  }

  @Get(':id')
  @Permit('timetables.read')
  find(@Param('id') id: string): Promise<WireTimetable> {
    return this.readModel.require(id);
  }

  @Get(':id/turns')
  @Permit('timetables.read')
  turnsOfDay(
    @Param('id') id: string,
    @Query(new ZodPipe(derivedTurnsQuerySchema)) { serviceDate }: DerivedTurnsQuery,
  ): Promise<WireDerivedTurn[]> {
    return this.turns.ofDay(id, serviceDate);
  }

  @Get(':id/difference')
  @Permit('timetables.read')
  difference(
    @Param('id') id: string,
    @Query(new ZodPipe(differenceQuerySchema)) query: DifferenceQuery,
  ): Promise<WireTimetableDifference> {
    return this.turns.differenceTo(id, query);
  }

  @Post(':id/activation')
  @HttpCode(200)
  @Permit('timetables.import')
  async activate(
    @Param('id') id: string,
    @Body(new ZodPipe(activationSchema)) request: ActivationRequest,
    @CurrentPerson() person: CurrentPersonFacts,
  ): Promise<WireTimetable> {
    await this.activations.activate(id, request, person);
    return this.readModel.require(id);
  }

  @Post(':id/roll-back')
  @HttpCode(200)
  @Permit('timetables.import')
  async rollBack(
    @Param('id') id: string,
    @CurrentPerson() person: CurrentPersonFacts,
  ): Promise<WireTimetable> {
    return this.readModel.require(await this.activations.rollBack(id, person));
  }
}
