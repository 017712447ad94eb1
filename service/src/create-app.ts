import 'reflect-metadata';
import { mkdirSync, readFileSync } from 'node:fs';
import { NestFactory } from '@nestjs/core';
import type { NestExpressApplication } from '@nestjs/platform-express';
import cookieParser from 'cookie-parser';
import { Logger } from 'nestjs-pino';
import { AppModule } from './app.module';
import { SessionCookie } from './auth/session-cookie';
import { Clock, SystemClock } from './common/clock';
import { refuseCrossSite } from './common/cross-site';
import { RefusalFilter } from './common/refusal.filter';
import { sendRequestId } from './common/request-id';
import { keepNothing, securityHeaders } from './common/security-headers';
import { serveUserInterface } from './common/user-interface';
import type { Config } from './config/config';

/** Bodies of JSON larger than this are refused with 413. */
const jsonLimit = '512kb';

/** What a service is made from. */
export interface AppOptions {
  config: Config;
  /** The machine's clock when absent. */
  clock?: Clock;
}

/** Builds the service and makes it ready to answer; the caller decides whether and where it listens. */
export async function createApp(options: AppOptions): Promise<NestExpressApplication> {
  const { config } = options;
  mkdirSync(config.dataDir, { recursive: true });
  const app = await NestFactory.create<NestExpressApplication>(
    AppModule.with(config, options.clock ?? new SystemClock()),
    {
      bodyParser: false,
      bufferLogs: true,
      abortOnError: false,
      // Live streams would keep a stopping server open for as long as their readers like.
      forceCloseConnections: true,
      ...(config.tls === null ? {} : { httpsOptions: readTls(config.tls) }),
    },
  );
  app.useLogger(app.get(Logger));
  if (config.trustProxy !== null) app.set('trust proxy', config.trustProxy);
  app.disable('x-powered-by');
  app.use(sendRequestId);
  app.use(securityHeaders(config.isSecure));
  serveUserInterface(app, config.uiFolder);
  app.use(cookieParser());
  const cookie = app.get(SessionCookie);
  app.use(
    '/api',
    keepNothing,
    refuseCrossSite({
      publicOrigin: new URL(config.publicUrl).origin,
      hasCookie: (request) => cookie.read(request) !== null,
    }),
  );
  app.useBodyParser('json', { limit: jsonLimit });
  app.useGlobalFilters(new RefusalFilter());
  await app.init();
  return app;
}

function readTls(tls: { cert: string; key: string }): { cert: Buffer; key: Buffer } {
  return { cert: readFileSync(tls.cert), key: readFileSync(tls.key) };
}
