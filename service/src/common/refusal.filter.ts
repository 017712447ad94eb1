import { type ArgumentsHost, Catch, type ExceptionFilter, HttpException, Logger } from '@nestjs/common';
import type { ErrorBody, ErrorCode } from '@stubpost/shared';
import type { Request, Response } from 'express';
import { Refusal } from './refusal';
import { pathForLog } from './path-for-log';
import { requestIdOf } from './request-id';

/** Codes for refusals that come from the framework and its body parsers, by their status. */
const codeOfStatus: Record<number, ErrorCode> = {
  400: 'request.malformed',
  401: 'session.missing',
  403: 'access.forbidden',
  404: 'route.unknown',
  413: 'request.too_large',
  415: 'request.content_type',
  429: 'request.too_many',
  503: 'server.busy',
};

/** Refusals that somebody who looks after security wants to see; never with names, bodies or addresses. */
const securityStatuses: readonly number[] = [403, 429];

const messageOfCode: Partial<Record<ErrorCode, string>> = {
  'request.malformed': 'the request cannot be read',
  'session.missing': 'nobody is signed in',
  'access.forbidden': 'not allowed',
  'route.unknown': 'there is no such route',
  'request.too_large': 'the request is larger than this route takes',
  'request.content_type': 'this route does not take that kind of content',
};

/** Makes every failure one kind of answer. What is our own fault is logged in full and told in general. */
@Catch()
export class RefusalFilter implements ExceptionFilter {
  private readonly logger = new Logger('request');

  catch(thrown: unknown, host: ArgumentsHost): void {
    const http = host.switchToHttp();
    const request = http.getRequest<Request>();
    const response = http.getResponse<Response>();
    const requestId = requestIdOf(request);
    const refusal = this.refusalFrom(thrown);
    if (refusal.status >= 500) {
      const stack = thrown instanceof Error ? thrown.stack : String(thrown);
      this.logger.error(
        `${request.method} ${pathForLog(request.originalUrl)} failed (${requestId}): ${stack}`,
      );
    }
    if (securityStatuses.includes(refusal.status)) {
      this.logger.warn(
        `${request.method} ${pathForLog(request.originalUrl)} refused: ${refusal.body.code} (${requestId})`,
      );
    }
    if (response.headersSent) {
      response.end();
      return;
    }
    const { retryAfterSeconds } = refusal.body.facts;
    if (typeof retryAfterSeconds === 'number') response.setHeader('Retry-After', String(retryAfterSeconds));
    response.status(refusal.status).json({ ...refusal.body, requestId } satisfies ErrorBody);
  }

  private refusalFrom(thrown: unknown): { status: number; body: Omit<ErrorBody, 'requestId'> } {
    if (thrown instanceof Refusal) {
      return {
        status: thrown.status,
        body: { code: thrown.code, message: thrown.message, facts: thrown.facts },
      };
    }
    const status = statusOf(thrown);
    const code = codeOfStatus[status];
    if (code === undefined) {
      return { status: 500, body: { code: 'server.fault', message: 'something went wrong here', facts: {} } };
    }
    return { status, body: { code, message: messageOfCode[code] ?? 'not possible', facts: {} } };
  }
}

function statusOf(thrown: unknown): number {
  if (thrown instanceof HttpException) return thrown.getStatus();
  // Errors of the body parsers carry `expose` and a client status.
  if (thrown instanceof Error && 'expose' in thrown && thrown.expose === true && 'status' in thrown) {
    return typeof thrown.status === 'number' ? thrown.status : 500;
  }
  return 500;
}
