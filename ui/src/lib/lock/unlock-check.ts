/*
 * What opens this phone again without a signal: a digest of the PIN or password, made when the person signed in here.
 *
 * What it protects: the page of a phone that lies about. The next person cannot go on recording under somebody else's name
 * by just touching it, and guessing at the screen is slowed down and ends after ten tries.
 * What it does not protect: a phone in the hands of somebody who takes its storage apart. A PIN of four digits is found in
 * minutes from any digest, however slow; entries and what was read stand in that storage as they are. Against that helps
 * the phone's own lock, and ending the session at the desk: the digest opens this page and never a session.
 */

/** Rounds of PBKDF2 with SHA-256. Source: OWASP Password Storage Cheat Sheet, 2023: 600,000. */
const rounds = 600_000;
const saltBytes = 16;
const digestBits = 256;
/** Wrong tries in a row that are free, and after which the digest is thrown away. Our choice. */
const freeTries = 3;
const longestTries = 10;
/** The wait after the first try that is not free; it doubles with each. Milliseconds. Our choice. */
const firstWait = 5000;

export type SecretKind = 'pin' | 'password';

interface KeptCheck {
  kind: SecretKind;
  salt: string;
  rounds: number;
  digest: string;
  failed: number;
  notBefore: number;
}

const placeOf = (personId: string): string => `stubpost.unlock.${personId}`;

function isCheck(value: unknown): value is KeptCheck {
  return (
    typeof value === 'object' &&
    value !== null &&
    'digest' in value &&
    'salt' in value &&
    'notBefore' in value
  );
}

function read(personId: string): KeptCheck | null {
  try {
    const kept: unknown = JSON.parse(localStorage.getItem(placeOf(personId)) ?? 'null');
    return isCheck(kept) ? kept : null;
  } catch {
    return null;
  }
}

function write(personId: string, check: KeptCheck): void {
  try {
    localStorage.setItem(placeOf(personId), JSON.stringify(check));
  } catch {
    // Nothing is kept: the person signs in again instead.
  }
}

const toText = (bytes: Uint8Array): string => btoa(String.fromCharCode(...bytes));
const toBytes = (text: string): Uint8Array<ArrayBuffer> =>
  Uint8Array.from(atob(text), (sign) => sign.charCodeAt(0));

/** Absent on plain http away from this machine, whatever the types say. */
const subtle = (): SubtleCrypto | undefined => globalThis.crypto.subtle;

async function digestOf(secret: string, salt: Uint8Array<ArrayBuffer>, times: number): Promise<string> {
  const engine = subtle();
  if (engine === undefined) throw new Error('This browser has no digests here');
  const key = await engine.importKey('raw', new TextEncoder().encode(secret), 'PBKDF2', false, [
    'deriveBits',
  ]);
  const bits = await engine.deriveBits(
    { name: 'PBKDF2', hash: 'SHA-256', salt, iterations: times },
    key,
    digestBits,
  );
  return toText(new Uint8Array(bits));
}

/** Keeps the digest of the secret somebody has just signed in with. Where that cannot be done, unlocking asks the service. */
export async function keepUnlockCheck(personId: string, kind: SecretKind, secret: string): Promise<void> {
  if (subtle() === undefined) return;
  const salt = crypto.getRandomValues(new Uint8Array(saltBytes));
  const digest = await digestOf(secret, salt, rounds);
  write(personId, { kind, salt: toText(salt), rounds, digest, failed: 0, notBefore: 0 });
}

/** Forgets the digest: the person signed out, or somebody else came. */
export function forgetUnlockCheck(personId: string): void {
  try {
    localStorage.removeItem(placeOf(personId));
  } catch {
    // Nothing was kept.
  }
}

/** Forgets the digests of everybody but one: whoever signs in is now the one whose phone this is. */
export function forgetOtherUnlockChecks(personId: string): void {
  try {
    for (const key of Object.keys(localStorage)) {
      if (key.startsWith(placeOf('')) && key !== placeOf(personId)) localStorage.removeItem(key);
    }
  } catch {
    // Nothing was kept.
  }
}

/** What opens the phone again; null when nothing was kept. */
export function unlockKind(personId: string): SecretKind | null {
  return read(personId)?.kind ?? null;
}

/** How a try to unlock ended. */
export type UnlockOutcome =
  | { kind: 'open' }
  | { kind: 'wrong'; triesLeft: number }
  | { kind: 'wait'; seconds: number }
  /** Too many wrong tries, or nothing kept: signing in is the way. */
  | { kind: 'sign-in' };

/** Checks a secret against the digest. `now` is the device's clock. */
export async function tryUnlock(personId: string, secret: string, now: number): Promise<UnlockOutcome> {
  const check = read(personId);
  if (check === null || subtle() === undefined) return { kind: 'sign-in' };
  // A clock set back must not lock somebody out for days.
  const left = Math.min(check.notBefore - now, firstWait * 2 ** (longestTries - freeTries));
  if (left > 0) return { kind: 'wait', seconds: Math.ceil(left / 1000) };
  const failed = check.failed + 1;
  const wait = failed < freeTries ? 0 : firstWait * 2 ** (failed - freeTries);
  // Counted before it is looked at: a page killed in the middle does not give tries away.
  write(personId, { ...check, failed, notBefore: now + wait });
  if ((await digestOf(secret, toBytes(check.salt), check.rounds)) === check.digest) {
    write(personId, { ...check, failed: 0, notBefore: 0 });
    return { kind: 'open' };
  }
  if (failed < longestTries) return { kind: 'wrong', triesLeft: longestTries - failed };
  forgetUnlockCheck(personId);
  return { kind: 'sign-in' };
}
