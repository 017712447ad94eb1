import http from 'node:http';
import type { AddressInfo } from 'node:net';
import type { NestExpressApplication } from '@nestjs/platform-express';
import { SignInService } from '../../src/auth/sign-in.service';
import { SessionCookie } from '../../src/auth/session-cookie';

/** One event as it came over the stream. */
export interface ReceivedEvent {
  id: number;
  event: string;
  data: unknown;
}

/** An open live stream. */
export interface Listening {
  status: number;
  headers: http.IncomingHttpHeaders;
  events: ReceivedEvent[];
  isClosed: () => boolean;
  /** Resolves with the first event that matches, also one that has come already. */
  next(matches: (event: ReceivedEvent) => boolean): Promise<ReceivedEvent>;
  /** Resolves when the server has ended the stream. */
  ended: Promise<void>;
  close(): void;
}

/** Opens a stream of a terminal as a person, from the last event that was seen when one is given. */
export async function listen(
  app: NestExpressApplication,
  personId: string,
  options: { terminal?: string; lastEventId?: number; byQuery?: boolean } = {},
): Promise<Listening> {
  const server = app.getHttpServer();
  if (!server.listening) await app.listen(0, '127.0.0.1');
  const { port } = server.address() as AddressInfo;
  const { token } = await app.get(SignInService).openFor(personId, 'test');
  const { terminal = 'HBR', lastEventId, byQuery = false } = options;
  const query = byQuery && lastEventId !== undefined ? `&lastEventId=${lastEventId}` : '';
  const header = !byQuery && lastEventId !== undefined ? { 'Last-Event-ID': String(lastEventId) } : {};
  return new Promise((resolve, reject) => {
    const request = http.get(
      {
        host: '127.0.0.1',
        port,
        path: `/api/live?terminal=${terminal}${query}`,
        headers: { Cookie: `${app.get(SessionCookie).name}=${token}`, ...header },
      },
      (response) => resolve(follow(request, response)),
    );
    request.on('error', reject);
  });
}

function follow(request: http.ClientRequest, response: http.IncomingMessage): Listening {
  const events: ReceivedEvent[] = [];
  const waiting: { matches: (event: ReceivedEvent) => boolean; resolve: (event: ReceivedEvent) => void }[] =
    [];
  let isClosed = false;
  let rest = '';
  response.setEncoding('utf8');
  response.on('data', (text: string) => {
    rest += text;
    const blocks = rest.split('\n\n');
    rest = blocks.pop() ?? '';
    for (const event of blocks.flatMap(parseBlock)) {
      events.push(event);
      for (const each of [...waiting]) {
        if (!each.matches(event)) continue;
        waiting.splice(waiting.indexOf(each), 1);
        each.resolve(event);
      }
    }
  });
  const ended = new Promise<void>((resolve) => {
    response.on('close', () => {
      isClosed = true;
      resolve();
    });
  });
  response.on('error', () => undefined);
  request.on('error', () => undefined);
  return {
    status: response.statusCode ?? 0,
    headers: response.headers,
    events,
    isClosed: () => isClosed,
    next: (matches) => {
      const known = events.find(matches);
      return known !== undefined
        ? Promise.resolve(known)
        : new Promise((resolve) => waiting.push({ matches, resolve }));
    },
    ended,
    close: () => request.destroy(),
  };
}

function parseBlock(block: string): ReceivedEvent[] {
  const field = (name: string) => new RegExp(`^${name}: (.*)$`, 'm').exec(block)?.[1];
  const data = field('data');
  if (data === undefined) return [];
  return [{ id: Number(field('id')), event: field('event') ?? '', data: JSON.parse(data) as unknown }];
}
