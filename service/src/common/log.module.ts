import type { IncomingMessage, ServerResponse } from 'node:http';
import { type DynamicModule, Module } from '@nestjs/common';
import { LoggerModule } from 'nestjs-pino';
import { type LogFn, type Logger as PinoLogger, stdTimeFunctions } from 'pino';
import { Config } from '../config/config';
import { pathForLog } from './path-for-log';
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
          hooks: { logMethod: dropWiring },
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

/** Parts of the framework that tell at every start how it wires itself up. */
const wiring = ['InstanceLoader', 'RouterExplorer', 'RoutesResolver', 'NestFactory'];
const infoLevel = 30;

function dropWiring(this: PinoLogger, args: Parameters<LogFn>, log: LogFn, level: number): void {
  const [facts] = args as unknown[];
  const context =
    typeof facts === 'object' && facts !== null && 'context' in facts ? facts.context : undefined;
  if (level <= infoLevel && wiring.includes(String(context))) return;
  log.apply(this, args);
}
