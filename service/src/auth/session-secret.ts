import { createSecretKey, type KeyObject, randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import type { Config } from '../config/config';

const fileName = 'session-secret';

/**
 * The key that signs session tokens: given by the environment, or made once and kept in the data folder, readable by
 * its owner alone. As a key object it is checked some fifty times faster than as text.
 */
export function loadSessionKey(config: Config): KeyObject {
  const secret = config.sessionSecret ?? keptSecret(config.dataDir);
  return createSecretKey(Buffer.from(secret, 'utf8'));
}

function keptSecret(dataDir: string): string {
  const file = path.join(dataDir, fileName);
  if (!existsSync(file)) {
    mkdirSync(dataDir, { recursive: true });
    writeFileSync(file, randomBytes(48).toString('base64url'), { mode: 0o600, flag: 'wx' });
  }
  const secret = readFileSync(file, 'utf8').trim();
  if (secret.length < 32)
    throw new Error(`${file} is too short to sign with: remove it to have a new one made`);
  return secret;
}
