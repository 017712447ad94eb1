import { mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import type { NestExpressApplication } from '@nestjs/platform-express';
import type { Clock } from '../../src/common/clock';
import { Config, readConfig } from '../../src/config/config';
import { createApp } from '../../src/create-app';

/** A service on a folder of its own. */
export interface Booted {
  app: NestExpressApplication;
  dataDir: string;
  /** Stops the service and removes its folder. */
  close(): Promise<void>;
}

/** What a test may choose about its service. */
export interface BootOptions {
  clock?: Clock;
  environment?: NodeJS.ProcessEnv;
  /** A built user interface, or something like it. */
  uiFolder?: string;
  /** A folder that is already there; it is left in place. */
  dataDir?: string;
}

/** Boots the whole service on a SQLite file in a temporary folder; supertest speaks to it without a port. */
export async function bootApp(options: BootOptions = {}): Promise<Booted> {
  const dataDir = options.dataDir ?? mkdtempSync(path.join(os.tmpdir(), 'stubpost-test-'));
  const read = readConfig({
    DATA_DIR: dataDir,
    DEMO: 'off',
    LOG_LEVEL: 'silent',
    ...options.environment,
  });
  const config = new Config({ ...read, uiFolder: options.uiFolder ?? read.uiFolder });
  const app = await createApp({ config, ...(options.clock === undefined ? {} : { clock: options.clock }) });
  return {
    app,
    dataDir,
    close: async () => {
      await app.close();
      if (options.dataDir === undefined) rmSync(dataDir, { recursive: true, force: true });
    },
  };
}
