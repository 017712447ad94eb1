import { existsSync } from 'node:fs';
import { run, runOrFail } from './child.mjs';
import { childEnvironment } from './child-environment.mjs';
import { stage } from './say.mjs';

/** Whether this process may install system packages: root on Debian or one of its kin. */
export function mayInstallPackages() {
  return process.getuid?.() === 0 && existsSync('/etc/debian_version') && existsSync('/usr/bin/apt-get');
}

const aptEnvironment = () => childEnvironment(process.env, { DEBIAN_FRONTEND: 'noninteractive' });
// Another apt may be at work, at boot for example: wait for it and do not fail.
const WAIT_FOR_OTHERS = ['-o', 'DPkg::Lock::Timeout=180'];

/** Installs system packages, after fetching the newest lists of what there is. */
export async function installPackages(names, purpose) {
  await stage(`Installing ${names.join(', ')} (${purpose})`, async () => {
    const env = aptEnvironment();
    // An update that cannot reach one of several sources still leaves usable lists: let the install decide.
    await run('apt-get', [...WAIT_FOR_OTHERS, 'update', '-q'], { env });
    await runOrFail(
      'apt-get',
      [...WAIT_FOR_OTHERS, 'install', '-y', '-q', '--no-install-recommends', ...names],
      {
        env,
        failure: `Could not install ${names.join(', ')}. Please install by hand, then start again.`,
      },
    );
  });
}

/** The version of a system package that could be installed, as Debian writes it; undefined when it is not on offer. */
export async function candidateVersion(name) {
  const { output } = await run('apt-cache', ['policy', name], {
    env: childEnvironment(process.env, { LC_ALL: 'C' }),
  });
  const version = /^\s*Candidate:\s*(\S+)/m.exec(output)?.[1];
  return version === '(none)' ? undefined : version;
}
