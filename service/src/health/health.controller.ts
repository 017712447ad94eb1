import { Controller, Get, Res } from '@nestjs/common';
import { formatInstant, type WireHealth } from '@stubpost/shared';
import type { Response } from 'express';
import { Public } from '../common/decorators';
import { Config } from '../config/config';
import { Reader } from '../database/reader';
import { UnitOfWork } from '../database/unit-of-work';
import { SweepHeartbeat } from './sweep-heartbeat';

/** Whether the service is well: the database answers on both connections, and the alert sweep is not silent. */
@Controller('api/health')
export class HealthController {
  constructor(
    private readonly config: Config,
    private readonly reader: Reader,
    private readonly unitOfWork: UnitOfWork,
    private readonly heartbeat: SweepHeartbeat,
  ) {}

  @Get()
  @Public()
  async health(@Res({ passthrough: true }) response: Response): Promise<WireHealth> {
    const problems: string[] = [];
    const schema = await this.schema().catch(() => {
      problems.push('the database does not answer');
      return 'unknown';
    });
    if (!this.heartbeat.isWell()) problems.push('the alert sweep is silent');
    const { lastSweepAt } = this.heartbeat;
    if (problems.length > 0) response.status(503);
    return {
      status: problems.length === 0 ? 'ok' : 'unwell',
      version: this.config.version,
      schema,
      lastSweepAt: lastSweepAt === null ? null : formatInstant(lastSweepAt),
      ...(problems.length === 0 ? {} : { problems }),
    };
  }

  /** Asks the reader for the newest migration, and the writer whether it is there at all. */
  private async schema(): Promise<string> {
    const [row] = await this.reader.query<{ name: string }>(
      'SELECT name FROM migration ORDER BY id DESC LIMIT 1',
    );
    await this.unitOfWork.between((writer) => writer.query('SELECT 1'));
    return row?.name ?? 'empty';
  }
}
