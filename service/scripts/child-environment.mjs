/**
 * Settings of npm that describe the machine (where packages come from, where headers lie) and not the run of npm that
 * may have called us. Only these survive for our own calls of npm.
 */
const MACHINE_SETTINGS = new Set(
  [
    'registry',
    'proxy',
    'https_proxy',
    'noproxy',
    'cafile',
    'cache',
    'userconfig',
    'globalconfig',
    'nodedir',
    'python',
  ].map((name) => `npm_config_${name}`),
);

const isFromNpm = (name) => name.startsWith('npm_') || name.startsWith('NPM_CONFIG_');

/**
 * The environment for our children: without NODE_ENV (production would leave out the tools that build), without what
 * a calling npm left behind, and with one time zone for everybody.
 */
export function childEnvironment(environment, extra = {}) {
  const kept = Object.entries(environment).filter(([name]) => name !== 'NODE_ENV' && !isFromNpm(name));
  return { ...Object.fromEntries(kept), TZ: 'UTC', ...extra };
}

/** As `childEnvironment`, for a call of npm itself. */
export function npmEnvironment(environment, extra = {}) {
  const settings = Object.entries(environment).filter(([name]) => MACHINE_SETTINGS.has(name.toLowerCase()));
  return childEnvironment(environment, { ...Object.fromEntries(settings), ...extra });
}

/** Makes this very process forget what its children would not get; used before the server starts inside it. */
export function cleanOwnEnvironment() {
  const clean = childEnvironment(process.env);
  for (const name of Object.keys(process.env)) if (!(name in clean)) delete process.env[name];
  process.env.TZ = clean.TZ;
}
