import { formatInstant, parseInstant, type Instant } from '../lib/instant';
import { refused, ok, type Result } from '../lib/result';
import { canonicalJson } from './canonical-json';
import type { Envelope } from './seal';

/** An entry as the log keeps it. `body` is its canonical JSON; null where the body is not given. */
export interface KeptEntry {
  sequence: number;
  id: string;
  receivedAt: Instant;
  previousHash: string;
  bodyHash: string;
  hash: string;
  body: string | null;
}

/** One line of an exported log, read back. */
export interface LogLine extends Envelope {
  hash: string;
  /** What the entry says; null where it was taken out or left out. Its hash stays. */
  body: Record<string, unknown> | null;
  /** Whether the line is written byte for byte as the log writes it. */
  isCanonical: boolean;
}

/** Why a line is no entry. */
export const LINE_REFUSALS = ['empty', 'not-utf-8', 'not-json', 'not-an-entry', 'member'] as const;
/** Why a line is no entry; with `member` the name of the member that is missing, wrong or unknown. */
export interface LineRefusal {
  reason: (typeof LINE_REFUSALS)[number];
  member?: string;
}

/**
 * An entry as one line of newline-delimited JSON, without the line's end: the RFC 8785 form of
 * `{ body, bodyHash, hash, id, previousHash, receivedAt, sequence }`. The body goes in as it is kept, so that the very
 * text that was sealed is what leaves the house.
 */
export function formatLogLine(entry: KeptEntry): string {
  const { body, receivedAt, ...envelope } = entry;
  const rest = canonicalJson({ ...envelope, receivedAt: formatInstant(receivedAt) });
  return `{"body":${body ?? 'null'},${rest.slice(1)}`;
}

const isHash = (value: unknown): boolean => typeof value === 'string' && /^[0-9a-f]{64}$/.test(value);
const isReceipt = (value: unknown): boolean => {
  const instant = typeof value === 'string' ? parseInstant(value) : null;
  return instant !== null && formatInstant(instant) === value;
};

const members: Record<string, (value: unknown) => boolean> = {
  body: (value) => value === null || isObject(value),
  bodyHash: isHash,
  hash: isHash,
  id: (value) => typeof value === 'string' && value !== '',
  previousHash: isHash,
  receivedAt: isReceipt,
  sequence: (value) => Number.isSafeInteger(value) && Number(value) >= 1,
};

/** Reads one line of an exported log, without the line's end. What a line says is not judged here, only its form. */
export function readLogLine(text: string): Result<LogLine, LineRefusal> {
  if (text.trim() === '') return refused({ reason: 'empty' });
  const value = parsed(text);
  if (value === undefined) return refused({ reason: 'not-json' });
  if (!isObject(value)) return refused({ reason: 'not-an-entry' });
  const wrong =
    Object.keys(members).find((name) => members[name]?.(value[name]) !== true) ??
    Object.keys(value).find((name) => !Object.hasOwn(members, name));
  if (wrong !== undefined) return refused({ reason: 'member', member: wrong });
  const canonical = canonicalOf(value);
  if (canonical === undefined) return refused({ reason: 'not-json' });
  return ok({ ...(value as unknown as Omit<LogLine, 'isCanonical'>), isCanonical: canonical === text });
}

function isObject(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

function parsed(text: string): unknown {
  try {
    return JSON.parse(text) as unknown;
  } catch {
    return undefined;
  }
}

/** JSON can be read that has no canonical form: half of a surrogate pair, a number out of range, a bottomless nest. */
function canonicalOf(value: unknown): string | undefined {
  try {
    return canonicalJson(value);
  } catch {
    return undefined;
  }
}
