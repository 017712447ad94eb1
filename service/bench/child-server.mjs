import { fork } from 'node:child_process';
import { once } from 'node:events';
import autocannon from 'autocannon';

/** A server in a process of its own, with its processor time. Answers what the server said when it was ready. */
export async function startServer(file, settings = {}) {
  const child = fork(file, [], {
    env: { ...process.env, BENCH: JSON.stringify(settings) },
    stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
  });
  const ready = await Promise.race([
    once(child, 'message').then(([message]) => message),
    once(child, 'exit').then(([code]) => {
      throw new Error(`${file} ended with ${code}`);
    }),
  ]);
  const ask = async (message) => {
    child.send(message);
    const [answer] = await once(child, 'message');
    return answer;
  };
  return { ready, ask, stop: () => void child.kill('SIGKILL') };
}

/**
 * Loads one address for a while over ten connections. Answers processor time of the server per request in
 * microseconds, which holds steady while wall-clock times of a busy machine do not, and requests per second.
 */
export async function load(server, request, seconds = 2) {
  const before = await server.ask('cpu');
  const result = await autocannon({ connections: 10, duration: seconds, ...request });
  const after = await server.ask('cpu');
  if (result.non2xx - (request.expect304 ? result['3xx'] : 0) > 0 || result.errors > 0)
    throw new Error(`${request.url}: ${result.non2xx} bad answers, ${result.errors} errors`);
  const requests = result.requests.total;
  return { cpu: (after - before) / requests, perSecond: requests / result.duration };
}
