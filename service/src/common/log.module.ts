import type { IncomingMessage, ServerResponse } from 'node:http';
import { type DynamicModule, Module } from '@nestjs/common';
import { LoggerModule } from 'nestjs-pino';
import { stdTimeFunctions } from 'pino';
import { Config } from '../config/config';
import { requestIdOf } from './request-id';

/**
 * Logs as lines of JSON, times in UTC. A request is told by method, path, status and id: no addresses, names, bodies,
 * cookies or queries, and no token of a one-time link.
 */
@Module({})
export class LogModule {
  static forRequests(): DynamicModule {
    return LoggerModule.forRootAsync({
      inject: [Config],
      useFactory: (config: Config) => ({
        pinoHttp: {
          level: config.logLevel,
          timestamp: stdTimeFunctions.isoTime,
          base: null,
          genReqId: requestIdOf,
          serializers: {
            req: (request: { id: string; method: string; url: string }) => ({
              id: request.id,
              method: request.method,
              path: pathForLog(request.url),
            }),
            res: (response: { statusCode: number }) => ({ status: response.statusCode }),
          },
          customLogLevel: (_request: IncomingMessage, response: ServerResponse, error?: Error) => {
            if (error !== undefined || response.statusCode >= 500) return 'error';
            return 'debug';
          },
        },
      }),
    });
  }
}

/** The path without its query, and with the token of a one-time link taken out. */
export function pathForLog(url: string): string {
  const [path = ''] = url.split('?');
  return path.replace(/^(\/api\/links\/|\/link\/).+/, '$1…');
}
