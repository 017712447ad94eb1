import {
  Controller,
  Get,
  Header,
  HttpCode,
  Param,
  Post,
  Query,
  UploadedFile,
  UseInterceptors,
} from '@nestjs/common';
import { FileInterceptor } from '@nestjs/platform-express';
import {
  onTimeQuerySchema,
  type DepartureRow,
  type OnTimeAnswer,
  type OnTimeQuery,
  type WireHistoryImport,
} from '@stubpost/shared';
import { CurrentPerson, Permit } from '../common/decorators';
import { Refusal } from '../common/refusal';
import type { CurrentPersonFacts } from '../common/signed-in';
import { ZodPipe } from '../common/zod.pipe';
import { toDeparturesCsv } from './departures-csv';
import { HistoryImportsService } from './history-imports.service';
import { OnTimeService } from './on-time.service';

/** Largest table of past departures: about half a million rows. */
const largestTableBytes = 64 * 1024 * 1024;

/** On-time history, the departures behind it, and tables of past departures. */
@Controller('api/history')
export class HistoryController {
  constructor(
    private readonly onTime: OnTimeService,
    private readonly imports: HistoryImportsService,
  ) {}

  @Get('on-time')
  @Permit('history.read', { terminal: 'query.terminal' })
  answer(@Query(new ZodPipe(onTimeQuerySchema)) query: OnTimeQuery): Promise<OnTimeAnswer> {
    return this.onTime.answer(query);
  }

  @Get('departures')
  @Permit('history.read', { terminal: 'query.terminal' })
  rows(@Query(new ZodPipe(onTimeQuerySchema)) query: OnTimeQuery): Promise<DepartureRow[]> {
    return this.onTime.rows(query);
  }

  @Get('departures.csv')
  @Permit('history.read', { terminal: 'query.terminal' })
  @Header('Content-Type', 'text/csv; charset=utf-8')
  @Header('Content-Disposition', 'attachment; filename="departures.csv"')
  async csv(@Query(new ZodPipe(onTimeQuerySchema)) query: OnTimeQuery): Promise<string> {
    return toDeparturesCsv(await this.onTime.rows(query));
  }

  @Post('departures')
  @HttpCode(202)
  @Permit('history.import')
  @UseInterceptors(FileInterceptor('file', { limits: { fileSize: largestTableBytes, files: 1 } }))
  async load(
    @UploadedFile() file: Express.Multer.File | undefined,
    @CurrentPerson() person: CurrentPersonFacts,
  ): Promise<{ id: string }> {
    if (file === undefined)
      throw new Refusal({ code: 'history.file_missing', message: 'send the table as the field "file"' });
    return { id: await this.imports.start({ fileName: file.originalname, content: file.buffer }, person) };
  }

  @Get('imports')
  @Permit('history.import')
  list(): Promise<WireHistoryImport[]> {
    return this.imports.list();
  }

  @Get('imports/:id')
  @Permit('history.import')
  find(@Param('id') id: string): Promise<WireHistoryImport> {
    return this.imports.require(id);
  }
}
