// `npm test`: installs and builds what has changed, then runs everything that can fail. Needs nothing but Node.
import { ensureBrowser } from './browser.mjs';
import { ensureBuilt } from './build.mjs';
import { checkTasks } from './checks.mjs';
import { endChildrenOnSignal } from './child.mjs';
import { ensureInstalled } from './install.mjs';
import { perform } from './perform.mjs';
import { prepare } from './prepare.mjs';
import { formatCounts } from './report.mjs';
import { runnerTasks } from './runners.mjs';
import { formatDuration, say, sayFailure } from './say.mjs';

async function testEverything() {
  let browser;
  await prepare(async () => {
    await ensureInstalled();
    browser = await ensureBrowser();
    await ensureBuilt();
  });
  const [longest, ...others] = runnerTasks(browser);
  endChildrenOnSignal();
  return perform([longest, ...checkTasks(), ...others]);
}

async function countsOfEverything() {
  try {
    return await testEverything();
  } catch (error) {
    sayFailure(error);
    return { passed: 0, failed: 1, skipped: 0 };
  }
}

const began = performance.now();
const counts = await countsOfEverything();
say(`\nAll together: ${formatDuration(performance.now() - began)}`);
say(formatCounts(counts));
process.exitCode = counts.failed > 0 ? 1 : 0;
