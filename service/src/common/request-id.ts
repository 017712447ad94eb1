import { randomUUID } from 'node:crypto';
import type { IncomingMessage, ServerResponse } from 'node:http';

const ids = new WeakMap<IncomingMessage, string>();

/** The id of a request, made on the first question and the same from then on. */
export function requestIdOf(request: IncomingMessage): string {
  const known = ids.get(request);
  if (known !== undefined) return known;
  const id = randomUUID();
  ids.set(request, id);
  return id;
}

/** Puts the id of each request into its answer, so that a report can name it. */
export function sendRequestId(request: IncomingMessage, response: ServerResponse, next: () => void): void {
  response.setHeader('X-Request-Id', requestIdOf(request));
  next();
}
