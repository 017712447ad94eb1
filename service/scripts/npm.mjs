import { run } from './child.mjs';
import { ROOT } from './paths.mjs';

/** The npm that called us if one did, else the one on the path. */
function npmCommand() {
  const script = process.env.npm_execpath ?? '';
  return /npm-cli\.[cm]?js$/.test(script) ? [process.execPath, script] : ['npm'];
}

const [PROGRAM, ...PREFIX] = npmCommand();

/** Calls npm at the top of the repository. */
export const callNpm = (args, options) => run(PROGRAM, [...PREFIX, ...args], { cwd: ROOT, ...options });
