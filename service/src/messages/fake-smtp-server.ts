import type { AddressInfo } from 'node:net';
import { SMTPServer } from 'smtp-server';
import type { FakeOptions, FakeServer } from './fake-server';
import { readMail } from './read-mail';

/** A mail server on a loopback port that keeps what it gets. */
export async function startFakeSmtp({ port, keep }: FakeOptions): Promise<FakeServer> {
  const server = new SMTPServer({
    disabledCommands: ['AUTH', 'STARTTLS'],
    disableReverseLookup: true,
    closeTimeout: 200,
    onData(stream, session, callback) {
      const parts: Buffer[] = [];
      stream.on('data', (part: Buffer) => parts.push(part));
      stream.on('end', () => {
        const raw = Buffer.concat(parts).toString('utf8');
        const to = session.envelope.rcptTo.map(({ address }) => address).join(', ');
        keep({ ...readMail(raw), channel: 'e-mail', to, raw }).then(
          () => callback(null, 'kept in the local box'),
          (error: unknown) => callback(error instanceof Error ? error : new Error(String(error))),
        );
      });
    },
  });
  // A reader that goes away mid-way is its own matter.
  server.on('error', () => undefined);
  await new Promise<void>((resolve, reject) => {
    server.server.once('error', reject);
    server.listen(port, '127.0.0.1', () => resolve());
  });
  return {
    port: (server.server.address() as AddressInfo).port,
    close: () => new Promise<void>((resolve) => server.close(() => resolve())),
  };
}
