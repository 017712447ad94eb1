import { createHash } from 'node:crypto';
import { createServer, type IncomingMessage, type ServerResponse } from 'node:http';
import type { AddressInfo } from 'node:net';
import type { BoxItem } from './box-folder';
import type { FakeOptions, FakeServer } from './fake-server';

/** Answers the two calls that text messages need, in the provider's form, and keeps what it gets. */
export async function startFakeSms(options: FakeOptions): Promise<FakeServer> {
  const server = createServer((request, response) => {
    answer(request, response, options).catch((error: unknown) => {
      reply(response, 500, { code: 20500, message: String(error) });
    });
  });
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(options.port, '127.0.0.1', resolve);
  });
  return {
    port: (server.address() as AddressInfo).port,
    close: () =>
      new Promise<void>((resolve) => {
        server.close(() => resolve());
        server.closeAllConnections();
      }),
  };
}

async function answer(
  request: IncomingMessage,
  response: ServerResponse,
  { keep, list }: FakeOptions,
): Promise<void> {
  const { pathname, searchParams } = new URL(request.url ?? '/', 'http://127.0.0.1');
  if (!pathname.endsWith('/Messages.json'))
    return reply(response, 404, { code: 20404, message: 'not found' });
  if (request.method === 'GET') {
    const items = (await list()).filter(
      ({ channel, to }) => channel === 'sms' && to === searchParams.get('To'),
    );
    return reply(response, 200, { messages: items.map(messageOf), next_page_uri: null });
  }
  const fields = new URLSearchParams(await bodyOf(request));
  const to = fields.get('To') ?? '';
  const text = fields.get('Body') ?? '';
  if (to === '' || text === '')
    return reply(response, 400, { code: 21602, message: 'To and Body are needed' });
  const count = (await list()).filter((item) => item.channel === 'sms').length;
  const id = `SM${createHash('sha256').update(`${count} ${to} ${text}`).digest('hex').slice(0, 32)}`;
  const item = { id, channel: 'sms', to, subject: '', text, raw: fields.toString() } as const;
  await keep(item);
  reply(response, 201, messageOf(item));
}

function messageOf({ id, to, text }: Pick<BoxItem, 'id' | 'to' | 'text'>): Record<string, unknown> {
  return {
    sid: id,
    to,
    body: text,
    status: 'queued',
    date_created: null,
    date_sent: null,
    date_updated: null,
  };
}

async function bodyOf(request: IncomingMessage): Promise<string> {
  const parts: Buffer[] = [];
  for await (const part of request) parts.push(part as Buffer);
  return Buffer.concat(parts).toString('utf8');
}

function reply(response: ServerResponse, status: number, body: unknown): void {
  response.writeHead(status, { 'Content-Type': 'application/json' });
  response.end(JSON.stringify(body));
}
