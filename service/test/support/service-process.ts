import { type ChildProcess, spawn } from 'node:child_process';
import { createServer } from 'node:net';
import type { AddressInfo } from 'node:net';
import path from 'node:path';

/** A service in a process of its own, as people run it. */
export interface ServiceProcess {
  child: ChildProcess;
  url: string;
  /** Everything it wrote so far. */
  output(): string;
  /** Its exit code, or the signal that ended it. */
  ended: Promise<number | NodeJS.Signals | null>;
}

/** A port nobody uses at this moment. */
export async function freePort(): Promise<number> {
  const server = createServer();
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const { port } = server.address() as AddressInfo;
  await new Promise((resolve) => server.close(resolve));
  return port;
}

/** Starts the built service with an environment of its own; does not wait for it to be ready. */
export function startService(environment: NodeJS.ProcessEnv): ServiceProcess {
  const child = spawn(process.execPath, [path.join(__dirname, '../../dist/main.js')], {
    env: { PATH: process.env.PATH, LOG_LEVEL: 'warn', DEMO: 'off', ...environment },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let output = '';
  const note = (bytes: Buffer) => {
    output += bytes.toString();
  };
  child.stdout.on('data', note);
  child.stderr.on('data', note);
  return {
    child,
    url: `http://127.0.0.1:${environment.PORT}`,
    output: () => output,
    ended: new Promise((resolve) => child.once('close', (code, signal) => resolve(code ?? signal))),
  };
}

/** Resolves once the service answers health; fails when it ended instead. */
export async function untilHealthy(service: ServiceProcess): Promise<void> {
  let hasEnded = false;
  void service.ended.then(() => {
    hasEnded = true;
  });
  for (;;) {
    if (hasEnded) throw new Error(`the service ended: ${service.output()}`);
    const answer = await fetch(`${service.url}/api/health`).catch(() => null);
    if (answer?.status === 200) return;
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
}
