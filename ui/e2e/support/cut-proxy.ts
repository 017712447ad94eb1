import http from 'node:http';
import type { AddressInfo, Socket } from 'node:net';

/** What happens to one request on its way: it gets through, never arrives, or arrives and its answer is lost. */
export type Fate = 'through' | 'lost-before' | 'lost-after';

/** A bad line between a phone and the service: everything the phone asks goes through here. */
export interface CutProxy {
  url: string;
  /** Decides about each request to the interface; pages and files always get through unless the line is down. */
  fate: (request: http.IncomingMessage) => Fate;
  /** With the line down, nothing is answered at all. */
  isDown: boolean;
  /** Added to the end of the worker, so that the browser takes it for a newer version. */
  workerSuffix: string;
  /** Entries that reached the service, whatever became of the answers. */
  entriesForwarded: number;
  stop: () => Promise<void>;
}

/** Puts such a line in front of the service. The name the phone calls by stays in the request, so that its cookie holds. */
export async function startCutProxy(target: string): Promise<CutProxy> {
  const { hostname, port } = new URL(target);
  const sockets = new Set<Socket>();
  const proxy: CutProxy = {
    url: '',
    fate: () => 'through',
    isDown: false,
    workerSuffix: '',
    entriesForwarded: 0,
    stop: async () => {
      for (const socket of sockets) socket.destroy();
      await new Promise((resolve) => server.close(resolve));
    },
  };

  const server = http.createServer((request, response) => {
    const isInterface = request.url?.startsWith('/api/') === true;
    const fate = proxy.isDown ? 'lost-before' : isInterface ? proxy.fate(request) : 'through';
    if (fate === 'lost-before') {
      request.socket.destroy();
      return;
    }
    if (request.method === 'POST' && request.url?.endsWith('/entries') === true) proxy.entriesForwarded += 1;
    const isWorker = request.url === '/worker.js';
    const headers = { ...request.headers };
    // The worker is looked at byte by byte: no "not modified", no compression.
    if (isWorker)
      for (const name of ['if-none-match', 'if-modified-since', 'accept-encoding']) delete headers[name];
    const onward = http.request(
      { hostname, port, path: request.url, method: request.method, headers },
      (answer) => {
        if (fate === 'lost-after' || proxy.isDown) {
          request.socket.destroy();
          return;
        }
        if (!isWorker) {
          response.writeHead(answer.statusCode ?? 502, answer.headers);
          answer.pipe(response);
          return;
        }
        const {
          'content-length': _length,
          etag: _etag,
          'last-modified': _modified,
          ...kept
        } = answer.headers;
        response.writeHead(answer.statusCode ?? 502, kept);
        answer.pipe(response, { end: false });
        answer.on('end', () => response.end(proxy.workerSuffix));
      },
    );
    onward.on('error', () => request.socket.destroy());
    response.on('close', () => onward.destroy());
    request.pipe(onward);
  });
  server.on('connection', (socket) => {
    sockets.add(socket);
    socket.on('close', () => sockets.delete(socket));
    socket.on('error', () => undefined);
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  proxy.url = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  return proxy;
}
