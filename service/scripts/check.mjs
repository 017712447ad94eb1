// `npm run check`: the tools that read the code without running it.
import { checkTasks } from './checks.mjs';
import { endChildrenOnSignal } from './child.mjs';
import { ensureInstalled } from './install.mjs';
import { perform } from './perform.mjs';
import { prepare } from './prepare.mjs';
import { formatCounts } from './report.mjs';
import { say, sayFailure } from './say.mjs';

try {
  await prepare(ensureInstalled);
  endChildrenOnSignal();
  // The types come first and alone: they write the declarations that the linters read.
  const [types, ...others] = checkTasks();
  const first = await perform([types]);
  const rest = await perform(others);
  say(formatCounts({ passed: first.passed + rest.passed, failed: first.failed + rest.failed, skipped: 0 }));
  process.exitCode = first.failed + rest.failed > 0 ? 1 : 0;
} catch (error) {
  sayFailure(error);
  process.exitCode = 1;
}
