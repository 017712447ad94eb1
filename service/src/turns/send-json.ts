import type { Response } from 'express';

/** Sends text that is JSON already, so that it is made once for all who ask. */
export function sendJson(response: Response, status: number, json: string): void {
  response.status(status).type('application/json').send(json);
}
