import type { NestExpressApplication } from '@nestjs/platform-express';
import { Restarter } from './common/restarter';
import { type Config, ConfigProblem, readConfig } from './config/config';
import { createApp } from './create-app';
import { readyDemo, type RunningDemo } from './demo/start-demo';

/**
 * A stopping service does not wait longer than this for streams and work under way; five seconds are promised, and a
 * busy machine needs some of them. What was acknowledged is on disk by then in any case.
 */
const longestStopMilliseconds = 3000;

/** Reads the environment, serves until it is told to end, and ends the process when it cannot start. */
export async function runService(environment: NodeJS.ProcessEnv): Promise<void> {
  try {
    const config = readConfig(environment);
    await new ServiceRun(config).start();
  } catch (error) {
    process.stderr.write(`${explain(error)}\n`);
    process.exit(1);
  }
}

/** One process: an application, replaced by a new one when a restart is asked for, and its end. */
class ServiceRun {
  private app: NestExpressApplication | undefined;
  private demo: RunningDemo | null = null;
  private isStopping = false;

  constructor(private readonly config: Config) {}

  async start(): Promise<void> {
    for (const signal of ['SIGTERM', 'SIGINT'] as const) process.once(signal, () => void this.stop());
    await this.serve();
  }

  private async serve(): Promise<void> {
    const { config } = this;
    const app = await createApp({ config });
    this.app = app;
    app.get(Restarter).onRequest(() => void this.restart());
    const playDemo = await readyDemo(app);
    await app.listen(config.port, config.host);
    this.demo = playDemo?.() ?? null;
    process.stdout.write(`Stubpost ${config.version} serves ${config.publicUrl}\n`);
  }

  /** Used when the installation moves to another database: everything in memory belongs to the old one. */
  private async restart(): Promise<void> {
    try {
      await this.end();
      if (!this.isStopping) await this.serve();
    } catch (error) {
      process.stderr.write(`${explain(error)}\n`);
      process.exit(1);
    }
  }

  private async stop(): Promise<void> {
    this.isStopping = true;
    setTimeout(() => process.exit(0), longestStopMilliseconds).unref();
    await this.end();
    process.exit(0);
  }

  private async end(): Promise<void> {
    await this.demo?.stop();
    await this.app?.close();
  }
}

function explain(error: unknown): string {
  if (error instanceof ConfigProblem) return error.message;
  const { code, port, address } = error as NodeJS.ErrnoException & { port?: number; address?: string };
  if (code === 'EADDRINUSE') {
    return `Port ${port} on ${address} is taken by another program. Choose another with PORT=… and start again.`;
  }
  if (code === 'EACCES' && port !== undefined)
    return `Port ${port} may not be used by this user. Choose another with PORT=….`;
  return error instanceof Error ? (error.stack ?? error.message) : String(error);
}
