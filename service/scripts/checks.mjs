import { run } from './child.mjs';
import { childEnvironment } from './child-environment.mjs';
import { ROOT, packageCommand } from './paths.mjs';

/** Ends a check that hangs; far above what any needs, also on a machine that is busy with other things. */
const LIMIT_MILLISECONDS = 25 * 60_000;
const SOURCES = ['shared/src', 'service/src', 'seed/src', 'ui/src'];

const CHECKS = [
  { name: 'types', command: 'tsc', args: ['-b'] },
  { name: 'eslint', command: 'eslint', args: ['.', '--max-warnings', '0'] },
  { name: 'prettier', command: 'prettier', args: ['--check', '.', '--log-level', 'warn'] },
  {
    name: 'dependency-cruiser',
    command: 'depcruise',
    args: ['--config', '.dependency-cruiser.mjs', ...SOURCES],
  },
  { name: 'knip', command: 'knip', args: ['--no-progress'] },
];

async function runCheck({ command, args }) {
  const env = childEnvironment(process.env, { NO_COLOR: '1' });
  const { code, output, timedOut } = await run(packageCommand(command), args, {
    cwd: ROOT,
    env,
    limitMilliseconds: LIMIT_MILLISECONDS,
  });
  const counts = { passed: code === 0 ? 1 : 0, failed: code === 0 ? 0 : 1, skipped: 0 };
  return { counts, output, reason: timedOut ? 'did not end in time and was stopped' : undefined };
}

/** The tools that read the code without running it, each as one task that passes or fails. */
export const checkTasks = () =>
  CHECKS.map((check) => ({ name: `check: ${check.name}`, run: () => runCheck(check) }));
