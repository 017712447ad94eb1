import { randomUUID } from 'node:crypto';
import path from 'node:path';
import { Injectable, Logger, type OnApplicationBootstrap, type OnModuleDestroy } from '@nestjs/common';
import {
  defaultStepPlanSteps,
  formatRouteTypes,
  parseRouteTypes,
  railRouteTypes,
  shortestTurnSeconds,
  type RouteTypes,
} from '@stubpost/shared';
import { Clock } from '../common/clock';
import { Refusal } from '../common/refusal';
import { Reader } from '../database/reader';
import { UnitOfWork } from '../database/unit-of-work';
import { feedLimits } from './feed-limits';
import type { FeedProgress, FeedReadAnswer } from './feed-reader';
import { FeedReaderFailed, FeedReaders } from './feed-readers';
import { isZip } from './feed-zip';
import { TimetablesRepository } from './timetables.repository';
import { UploadStore } from './upload-store';

/** A file as it was streamed to disk. */
export interface IncomingFile {
  path: string;
  originalname: string;
  size: number;
}

/** After so many readings that took the service down with them a file is given up. */
const mostAttempts = 3;
const longestFileName = 200;

/**
 * Brings timetables in: takes the upload, answers at once, and reads the zip in the background, one after the other.
 * What was being read when the service ended is read again at the next start.
 */
@Injectable()
export class TimetableImports implements OnApplicationBootstrap, OnModuleDestroy {
  private readonly logger = new Logger(TimetableImports.name);
  private readonly ending = new AbortController();
  private readonly progress = new Map<string, FeedProgress>();
  private tail: Promise<void> = Promise.resolve();

  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly reader: Reader,
    private readonly timetables: TimetablesRepository,
    private readonly uploads: UploadStore,
    private readonly readers: FeedReaders,
    private readonly clock: Clock,
  ) {}

  async onApplicationBootstrap(): Promise<void> {
    await this.uploads.tidy();
    const unfinished = await this.reader.query<{ id: string; route_types: string }>(
      `SELECT id, route_types FROM timetable WHERE state = 'reading' ORDER BY created_at, id`,
    );
    for (const { id, route_types } of unfinished)
      this.enqueue(id, parseRouteTypes(route_types) ?? railRouteTypes);
  }

  async onModuleDestroy(): Promise<void> {
    this.ending.abort();
    await this.tail;
  }

  /** How far the reading of a timetable is; null when it is not being read. */
  progressOf(id: string): FeedProgress | null {
    return this.progress.get(id) ?? null;
  }

  /** Resolves when everything taken in so far has been read. */
  async settled(): Promise<void> {
    await this.tail;
  }

  /** Takes an upload in and gives its id; refuses at once what is no zip. */
  async start(file: IncomingFile, routeTypes: RouteTypes, uploadedBy: string): Promise<string> {
    const id = randomUUID();
    if (!(await isZip(file.path))) {
      await this.uploads.discard(file.path);
      throw new Refusal({ code: 'timetable.not_a_zip', message: 'the file is not a zip' });
    }
    await this.uploads.keep(id, file.path);
    await this.unitOfWork.run((transaction) =>
      this.timetables.insert(transaction, {
        id,
        version: 1,
        state: 'reading',
        fileName: path.basename(file.originalname).slice(0, longestFileName),
        fileBytes: file.size,
        routeTypes: formatRouteTypes(routeTypes),
        attempts: 0,
        uploadedBy,
        readAt: null,
        problems: [],
        summary: null,
        createdAt: this.clock.now(),
      }),
    );
    this.enqueue(id, routeTypes);
    return id;
  }

  private enqueue(id: string, routeTypes: RouteTypes): void {
    this.progress.set(id, { stage: 'Waiting', share: 0 });
    this.tail = this.tail
      .then(() => this.work(id, routeTypes))
      .catch((error: unknown) => {
        this.logger.error(`timetable ${id}: ${error instanceof Error ? error.stack : String(error)}`);
      })
      .finally(() => this.progress.delete(id));
  }

  private async work(id: string, routeTypes: RouteTypes): Promise<void> {
    if (this.ending.signal.aborted) return;
    const attempts = await this.unitOfWork.run((transaction) =>
      this.timetables.beginReading(transaction, id),
    );
    if (attempts === 0) return;
    const answer = await this.answerFor(id, routeTypes, attempts);
    if (answer === null) return;
    const now = this.clock.now();
    await this.unitOfWork.run((transaction) =>
      this.timetables.finishReading(transaction, { id, answer, now }),
    );
    if (!answer.ok) await this.uploads.discard(this.uploads.pathOf(id));
  }

  /** What came out of the zip; null when the service is ending and the next start will try again. */
  private async answerFor(
    id: string,
    routeTypes: RouteTypes,
    attempts: number,
  ): Promise<FeedReadAnswer | null> {
    if (!this.uploads.has(id))
      return refusedBecause('upload.gone', 'The uploaded file is not there any more.');
    if (attempts > mostAttempts) {
      const message = `Reading was begun ${mostAttempts} times and never came to an end. The file is given up.`;
      return refusedBecause('reading.given_up', message);
    }
    try {
      return await this.readers.read(
        {
          path: this.uploads.pathOf(id),
          routeTypes,
          limits: feedLimits,
          shortestTurnSeconds: shortestTurnSeconds(defaultStepPlanSteps),
        },
        { signal: this.ending.signal, onProgress: (progress) => this.progress.set(id, progress) },
      );
    } catch (error) {
      if (this.ending.signal.aborted) return null;
      const why = error instanceof FeedReaderFailed ? error.message : 'something went wrong here';
      this.logger.error(`reading timetable ${id}: ${error instanceof Error ? error.stack : String(error)}`);
      return refusedBecause('reading.failed', `The file could not be read to its end: ${why}.`);
    }
  }
}

function refusedBecause(code: string, message: string): FeedReadAnswer {
  return { ok: false, problems: [{ severity: 'refused', file: null, line: null, code, message }] };
}
