import { spawn, type ChildProcess } from 'node:child_process';
import { mkdtemp, rm } from 'node:fs/promises';
import { createServer, type AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { fileURLToPath } from 'node:url';

const mainFile = fileURLToPath(new URL('../../../service/dist/main.js', import.meta.url));

/** The first administrator of the servers these tests start. */
export const administrator = { email: 'admin@example.test', password: 'stub end and bumping post' };

/** A running service of its own, on a port and a folder of its own. */
export interface TestServer {
  url: string;
  /** Ends it hard, as a crash would, and starts it again on the same folder and port. */
  crashAndRestart(): Promise<void>;
  stop(): Promise<void>;
}

async function freePort(): Promise<number> {
  const probe = createServer();
  await new Promise<void>((resolve) => probe.listen(0, '127.0.0.1', resolve));
  const { port } = probe.address() as AddressInfo;
  await new Promise((resolve) => probe.close(resolve));
  return port;
}

async function untilHealthy(url: string, child: ChildProcess): Promise<void> {
  for (let attempt = 0; attempt < 600; attempt += 1) {
    if (child.exitCode !== null)
      throw new Error(`the service ended with ${child.exitCode} before it was well`);
    const well = await fetch(`${url}/api/health`).then(
      (answer) => answer.ok,
      () => false,
    );
    if (well) return;
    await pause(100);
  }
  throw new Error('the service was not well within a minute');
}

/** Starts the built service; `demo: 'off'` is an empty installation with `administrator` in it. */
export async function startServer(demo: 'live' | 'off' = 'off'): Promise<TestServer> {
  const dataDir = await mkdtemp(path.join(tmpdir(), 'stubpost-e2e-'));
  const port = await freePort();
  const url = `http://127.0.0.1:${port}`;
  const launch = async (): Promise<ChildProcess> => {
    const child = spawn(process.execPath, [mainFile], {
      env: {
        ...process.env,
        NODE_ENV: 'production',
        TZ: 'UTC',
        PORT: String(port),
        DATA_DIR: dataDir,
        DEMO: demo,
        LOG_LEVEL: 'error',
        ...(demo === 'off'
          ? { ADMIN_EMAIL: administrator.email, ADMIN_PASSWORD: administrator.password }
          : {}),
      },
      stdio: ['ignore', 'inherit', 'inherit'],
    });
    await untilHealthy(url, child);
    return child;
  };
  const end = async (child: ChildProcess, signal: NodeJS.Signals): Promise<void> => {
    if (child.exitCode !== null || child.signalCode !== null) return;
    const gone = new Promise((resolve) => child.once('exit', resolve));
    child.kill(signal);
    await gone;
  };
  let child = await launch();
  return {
    url,
    crashAndRestart: async () => {
      await end(child, 'SIGKILL');
      child = await launch();
    },
    stop: async () => {
      await end(child, 'SIGTERM');
      await rm(dataDir, { recursive: true, force: true });
    },
  };
}
