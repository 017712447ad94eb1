import { existsSync } from 'node:fs';
import path from 'node:path';
import { Worker } from 'node:worker_threads';
import { Injectable } from '@nestjs/common';
import { type FeedProgress, type FeedReadAnswer, type FeedReadRequest, readFeed } from './feed-reader';
import type { FeedWorkerMessage } from './feed-worker';

/** Reads zips away from whoever asked. */
export abstract class FeedReaders {
  /**
   * Reads one zip. Rejects with an `AbortError` when the signal says stop, and with `FeedReaderFailed` when the
   * reading itself came to grief.
   */
  abstract read(
    request: FeedReadRequest,
    options: { signal: AbortSignal; onProgress: (progress: FeedProgress) => void },
  ): Promise<FeedReadAnswer>;
}

/** The reading ended without an answer, and in words why. */
export class FeedReaderFailed extends Error {}

/** Memory a reading may take; more ends the reading and not the service. */
const memoryMegabytes = 1536;

/** One worker thread for each zip, so that a large timetable does not hold up anybody's request. */
@Injectable()
export class WorkerFeedReaders extends FeedReaders {
  /** The worker is loaded by Node itself, so it must be a compiled file. */
  constructor(private readonly file: string) {
    super();
  }

  override read(
    request: FeedReadRequest,
    { signal, onProgress }: Parameters<FeedReaders['read']>[1],
  ): Promise<FeedReadAnswer> {
    return new Promise((resolve, reject) => {
      const worker = new Worker(this.file, {
        workerData: request,
        resourceLimits: { maxOldGenerationSizeMb: memoryMegabytes },
      });
      const stop = (): void => void worker.terminate();
      signal.addEventListener('abort', stop, { once: true });
      worker.on('message', (message: FeedWorkerMessage) => {
        if (message.kind === 'progress') onProgress(message.progress);
        else resolve(message.answer);
      });
      worker.on('error', (error: NodeJS.ErrnoException) => reject(new FeedReaderFailed(whyItEnded(error))));
      worker.on('exit', () => {
        signal.removeEventListener('abort', stop);
        // After an answer or an error this changes nothing any more.
        reject(signal.aborted ? abortError() : new FeedReaderFailed('the reading ended without an answer'));
      });
    });
  }
}

function whyItEnded(error: NodeJS.ErrnoException): string {
  if (error.code === 'ERR_WORKER_OUT_OF_MEMORY') return `it took more than ${memoryMegabytes} MB of memory`;
  return error.message;
}

function abortError(): Error {
  return new DOMException('stopped', 'AbortError');
}

/** Reads in this very thread: for tests that run the sources as they are. */
@Injectable()
export class SameThreadFeedReaders extends FeedReaders {
  override async read(
    request: FeedReadRequest,
    { signal, onProgress }: Parameters<FeedReaders['read']>[1],
  ): Promise<FeedReadAnswer> {
    const answer = await readFeed(request, onProgress);
    if (signal.aborted) throw abortError();
    return answer;
  }
}

/** Workers where the compiled worker stands beside this file, else this thread. */
export function feedReadersHere(): FeedReaders {
  const file = path.join(__dirname, 'feed-worker.js');
  return existsSync(file) ? new WorkerFeedReaders(file) : new SameThreadFeedReaders();
}
