import assert from 'node:assert/strict';
import { test } from 'node:test';
import { childEnvironment, npmEnvironment } from './child-environment.mjs';

const CALLED_BY_NPM = {
  PATH: '/usr/bin',
  NODE_ENV: 'production',
  TZ: 'America/Denver',
  npm_config_omit: 'dev',
  NPM_CONFIG_PRODUCTION: 'true',
  npm_lifecycle_event: 'start',
  npm_config_cafile: '/etc/own-authority.pem',
  NPM_TOKEN: 'kept for the settings file of its owner',
};

test('a child gets neither NODE_ENV nor what a calling npm left, and one time zone', () => {
  assert.deepEqual(childEnvironment(CALLED_BY_NPM, { LANG: 'C' }), {
    PATH: '/usr/bin',
    NPM_TOKEN: CALLED_BY_NPM.NPM_TOKEN,
    TZ: 'UTC',
    LANG: 'C',
  });
});

test('npm itself also gets the settings that describe the machine', () => {
  const given = npmEnvironment(CALLED_BY_NPM);
  assert.equal(given.npm_config_cafile, '/etc/own-authority.pem');
  assert.equal('npm_config_omit' in given || 'NPM_CONFIG_PRODUCTION' in given, false);
});
