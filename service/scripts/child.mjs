import { spawn } from 'node:child_process';
import { constants } from 'node:os';
import { setTimeout as sleep } from 'node:timers/promises';
import { descendantsOf } from './process-table.mjs';
import { Failure } from './say.mjs';

const running = new Set();
const watchers = new Set();
let isEnding = false;

/** Calls `tell` with the list of running child processes whenever it changes. */
export function onChildrenChanged(tell) {
  watchers.add(tell);
  return () => watchers.delete(tell);
}

function tellWatchers() {
  const pids = [...running].map((child) => child.pid);
  for (const tell of watchers) tell(pids);
}

/**
 * Runs a command to its end and collects what it prints, standard output and error in the order they came.
 * `limitMilliseconds` ends a command that hangs. Resolves in every case; a command that cannot start has code 127.
 */
export function run(command, args, { cwd, env, limitMilliseconds } = {}) {
  return new Promise((resolve) => {
    const child = spawn(command, args, { cwd, env, stdio: ['ignore', 'pipe', 'pipe'] });
    let output = '';
    let timedOut = false;
    const timer = limitMilliseconds === undefined ? undefined : setTimeout(onLimit, limitMilliseconds);
    function onLimit() {
      timedOut = true;
      for (const pid of [child.pid, ...descendantsOf(child.pid)]) signal(pid, 'SIGKILL');
    }
    function end(code) {
      clearTimeout(timer);
      running.delete(child);
      // Once we are told to end nobody may draw a conclusion from a child that we ended ourselves.
      if (isEnding) return;
      tellWatchers();
      resolve({ code, output, timedOut });
    }
    const collect = (chunk) => (output += chunk);
    child.stdout.setEncoding('utf8').on('data', collect);
    child.stderr.setEncoding('utf8').on('data', collect);
    child.on('error', (error) => {
      output += `${error.message}\n`;
      end(127);
    });
    child.on('close', (code, signalName) => end(code ?? 128 + constants.signals[signalName]));
    if (child.pid === undefined) return;
    running.add(child);
    tellWatchers();
  });
}

/** As `run`, for a command that must succeed: throws a `Failure` with the given sentence and the output. */
export async function runOrFail(command, args, { failure, ...options }) {
  const { code, output } = await run(command, args, options);
  if (code !== 0) throw new Failure(`${failure} (exit code ${code})`, { output });
  return output;
}

function signal(pid, name) {
  try {
    process.kill(pid, name);
  } catch {
    // It ended by itself in the meantime, which is what we wanted.
  }
}

async function stopEverything() {
  const pids = descendantsOf(process.pid);
  for (const child of running) if (!pids.includes(child.pid)) pids.push(child.pid);
  for (const pid of pids) signal(pid, 'SIGTERM');
  for (let waited = 0; waited < 3000 && running.size > 0; waited += 50) await sleep(50);
  for (const pid of [...pids, ...descendantsOf(process.pid)]) signal(pid, 'SIGKILL');
}

/**
 * While we prepare, a signal ends our children too and then us, with the code a shell would give. The function that
 * comes back takes the handlers away again.
 */
export function endChildrenOnSignal({ before = () => undefined } = {}) {
  const names = ['SIGINT', 'SIGTERM', 'SIGHUP'];
  async function onSignal(name) {
    if (isEnding) return;
    isEnding = true;
    await stopEverything();
    before();
    process.exit(128 + constants.signals[name]);
  }
  for (const name of names) process.on(name, onSignal);
  return () => names.forEach((name) => process.off(name, onSignal));
}
