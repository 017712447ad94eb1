import { type INestApplicationContext, Logger } from '@nestjs/common';
import { Installation } from '../database/installation';
import { DemoService } from './demo.service';

/**
 * What the package with the demo's stories exports: fills the database behind an application where that is still to
 * be done, then lets crews act as time passes. Resolves once nothing more is to be done at all; must stop writing soon
 * after the signal is aborted, and then resolve.
 */
export type StartDemo = (app: INestApplicationContext, signal: AbortSignal) => Promise<void>;

/** A package beside this one, loaded only for a demo; it imports this one, so this one cannot import it. */
const storiesPackage = '@stubpost/seed';

const logger = new Logger('demo');

/** A demo that is being filled or played. */
export interface RunningDemo {
  stop(): Promise<void>;
}

/**
 * Makes a demo ready where this installation wants one: from here on the database says that it is a demo. Gives what
 * starts the playing, which then goes on behind; null where there is nothing to play.
 */
export async function readyDemo(app: INestApplicationContext): Promise<(() => RunningDemo) | null> {
  if (!(await app.get(Installation).isDemoWanted())) return null;
  const startDemo = findStories();
  if (startDemo === null) {
    logger.warn(`there is no demo to play: ${storiesPackage} is not built. DEMO=off starts without one`);
    return null;
  }
  await app.get(DemoService).begin();
  return () => play(app, startDemo);
}

function play(app: INestApplicationContext, startDemo: StartDemo): RunningDemo {
  const stopping = new AbortController();
  const ended = startDemo(app, stopping.signal).catch((error: unknown) => {
    if (stopping.signal.aborted) return;
    logger.error(`the demo broke off: ${error instanceof Error ? error.stack : String(error)}`);
  });
  return {
    stop: () => {
      stopping.abort();
      return ended;
    },
  };
}

function findStories(): StartDemo | null {
  try {
    // eslint-disable-next-line @typescript-eslint/no-require-imports -- a static import would be a cycle of packages
    const stories = require(storiesPackage) as { startDemo?: unknown };
    return typeof stories.startDemo === 'function' ? (stories.startDemo as StartDemo) : null;
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'MODULE_NOT_FOUND') return null;
    throw error;
  }
}
