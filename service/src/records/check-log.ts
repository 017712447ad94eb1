// The checker of an exported log: a program for any machine with Node. The build makes one file of it and of what it
// needs, which is what people take along; it knows no server and no network.
import { createHash } from 'node:crypto';
import { createReadStream, readFileSync } from 'node:fs';
import { parseArgs, TextDecoder } from 'node:util';
import { LogCheck, type LogHead, type LogVerdict, formatLogFault, formatLogNote } from '@stubpost/shared';

const usage = `Checks an exported log of Stubpost: that no entry was changed, taken out, added, doubled or moved.

  node check-log.mjs FILE [--heads HEADS.json] [--head HASH@NUMBER] [--to DAY]

  FILE     the exported log, one entry a line
  --heads  published daily heads, as the page or the interface gives them; each of them must be met
  --head   one published head: its hash of 64 characters, @, and the number of its entry; may be given again
  --to     leaves heads of later days than this aside, for a file that ends with that day: 2026-03-03

Ends with 0 when the log is whole, with 1 when it is broken, with 2 when it could not be read.
`;

const exitCodes = { whole: 0, broken: 1, unread: 2 } as const;
const mostFaultsShown = 20;

/** Something the person at the keyboard has to put right; nothing was checked. */
class NotRead extends Error {}

interface Task {
  file: string;
  heads: LogHead[];
}

function taskFrom(args: readonly string[]): Task | null {
  const { values, positionals } = readOptions(args);
  if (values.help === true) return null;
  const [file, ...more] = positionals;
  if (file === undefined) throw new NotRead('No file was given.');
  if (more.length > 0) throw new NotRead(`One file at a time: ${more.join(', ')} is too much.`);
  const { to } = values;
  if (to !== undefined && !/^\d{4}-\d{2}-\d{2}$/.test(to))
    throw new NotRead(`--to takes a day such as 2026-03-03, not "${to}".`);
  const heads = [
    ...(values.head ?? []).map(headFromText),
    ...(values.heads ?? []).flatMap(headsFromFile),
  ].filter(({ date }) => to === undefined || date === undefined || date <= to);
  return { file, heads };
}

function readOptions(args: readonly string[]) {
  try {
    return parseArgs({
      args: [...args],
      allowPositionals: true,
      options: {
        head: { type: 'string', multiple: true },
        heads: { type: 'string', multiple: true },
        to: { type: 'string' },
        help: { type: 'boolean', short: 'h' },
      },
    });
  } catch (error) {
    throw new NotRead(error instanceof Error ? error.message : String(error));
  }
}

function headFromText(text: string): LogHead {
  const [, hash, sequence] = /^([0-9a-f]{64})@(\d{1,15})$/i.exec(text.trim()) ?? [];
  if (hash === undefined) throw new NotRead(`--head takes HASH@NUMBER, such as 5f3c…@1204, not "${text}".`);
  return { hash: hash.toLowerCase(), sequence: Number(sequence) };
}

function headsFromFile(file: string): LogHead[] {
  const read = readJson(file);
  if (!Array.isArray(read) || !read.every(isHead)) throw new NotRead(`${file} is not a list of heads.`);
  return read.map(({ sequence, hash, date }) => ({ sequence, hash, date }));
}

function readJson(file: string): unknown {
  try {
    return JSON.parse(readFileSync(file, 'utf8')) as unknown;
  } catch (error) {
    throw new NotRead(`${file} cannot be read: ${error instanceof Error ? error.message : String(error)}`);
  }
}

function isHead(value: unknown): value is LogHead {
  if (typeof value !== 'object' || value === null) return false;
  const { sequence, hash, date } = value as Record<string, unknown>;
  return (
    Number.isSafeInteger(sequence) &&
    typeof hash === 'string' &&
    /^[0-9a-f]{64}$/.test(hash) &&
    (date === undefined || typeof date === 'string')
  );
}

const newline = 0x0a;

/** The lines of a file as bytes, without their ends. */
async function* linesOf(file: string): AsyncGenerator<{ bytes: Buffer; isEnded: boolean }> {
  let begun: Buffer[] = [];
  for await (const chunk of createReadStream(file) as AsyncIterable<Buffer>) {
    let from = 0;
    for (let end = chunk.indexOf(newline); end >= 0; end = chunk.indexOf(newline, from)) {
      yield { bytes: Buffer.concat([...begun, chunk.subarray(from, end)]), isEnded: true };
      begun = [];
      from = end + 1;
    }
    if (from < chunk.length) begun.push(chunk.subarray(from));
  }
  if (begun.length > 0) yield { bytes: Buffer.concat(begun), isEnded: false };
}

const sha256 = (text: string): string => createHash('sha256').update(text, 'utf8').digest('hex');
const utf8 = new TextDecoder('utf-8', { fatal: true, ignoreBOM: true });

function textOf(bytes: Buffer): string | null {
  try {
    return utf8.decode(bytes);
  } catch {
    return null;
  }
}

async function checkFile({ file, heads }: Task): Promise<LogVerdict> {
  const check = new LogCheck({ sha256, heads });
  let isCutShort = false;
  try {
    for await (const { bytes, isEnded } of linesOf(file)) {
      const text = textOf(bytes);
      if (text === null) check.takeUnreadable({ reason: 'not-utf-8' });
      else check.take(text);
      isCutShort = !isEnded;
    }
  } catch (error) {
    throw new NotRead(`${file} cannot be read: ${error instanceof Error ? error.message : String(error)}`);
  }
  return check.end({ isCutShort });
}

const count = (value: number): string => value.toLocaleString('en-US');

function reportOf(file: string, verdict: LogVerdict): string[] {
  const { first, last, faults, faultCount } = verdict;
  const lines = [`Log: ${file}, ${count(verdict.lines)} lines, ${count(verdict.entries)} entries.`];
  if (first !== null && last !== null)
    lines.push(
      `From no. ${count(first.sequence)}, received ${first.receivedAt},`,
      `to no. ${count(last.sequence)}, received ${last.receivedAt}, hash ${last.hash}.`,
    );
  lines.push('', ...(verdict.isWhole ? wholeWords(verdict) : ['BROKEN. The first thing that is wrong:']));
  lines.push(...faults.slice(0, mostFaultsShown).map((fault) => `- ${formatLogFault(fault)}`));
  if (faultCount > mostFaultsShown) lines.push(`- and ${count(faultCount - mostFaultsShown)} more.`);
  if (verdict.notes.length > 0)
    lines.push('', 'Not checked:', ...verdict.notes.map((note) => `- ${formatLogNote(note)}`));
  return lines;
}

function wholeWords({ metHead, metHeads }: LogVerdict): string[] {
  const words = [
    'WHOLE. Every entry fits its seal and is chained to the one before it; none is missing, added or moved.',
  ];
  if (metHead !== null) {
    const day = metHead.date === undefined ? '' : ` of ${metHead.date}`;
    words.push(
      `Published heads met: ${count(metHeads)}; the newest is the one${day} at no. ${count(metHead.sequence)}.`,
    );
  }
  return words;
}

async function main(args: readonly string[]): Promise<number> {
  try {
    const task = taskFrom(args);
    if (task === null) {
      process.stdout.write(usage);
      return exitCodes.whole;
    }
    const verdict = await checkFile(task);
    if (verdict.lines === 0 && verdict.isWhole)
      throw new NotRead(`${task.file} is empty: there is nothing to check.`);
    process.stdout.write(`${reportOf(task.file, verdict).join('\n')}\n`);
    return verdict.isWhole ? exitCodes.whole : exitCodes.broken;
  } catch (error) {
    if (!(error instanceof NotRead)) throw error;
    process.stderr.write(`NOT CHECKED. ${error.message}\n\n${usage}`);
    return exitCodes.unread;
  }
}

void main(process.argv.slice(2)).then((code) => {
  process.exitCode = code;
});
