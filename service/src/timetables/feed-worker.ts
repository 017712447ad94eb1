import { parentPort, workerData } from 'node:worker_threads';
import { type FeedProgress, type FeedReadAnswer, type FeedReadRequest, readFeed } from './feed-reader';

/** What the worker sends while it reads, and at the end. */
export type FeedWorkerMessage =
  { kind: 'progress'; progress: FeedProgress } | { kind: 'answer'; answer: FeedReadAnswer };

/** Progress is told at most so often; nobody can see more. */
const millisecondsBetweenProgress = 100;

async function work(port: NonNullable<typeof parentPort>): Promise<void> {
  let toldAt = -Infinity;
  const send = (message: FeedWorkerMessage): void => port.postMessage(message);
  const answer = await readFeed(workerData as FeedReadRequest, (progress) => {
    if (performance.now() - toldAt < millisecondsBetweenProgress) return;
    toldAt = performance.now();
    send({ kind: 'progress', progress });
  });
  send({ kind: 'answer', answer });
}

if (parentPort !== null) void work(parentPort);
