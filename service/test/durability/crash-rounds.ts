import { execFileSync, spawn } from 'node:child_process';
import { copyFileSync, existsSync, readdirSync, renameSync, rmSync } from 'node:fs';
import path from 'node:path';
import { createInterface } from 'node:readline';
import Database from 'better-sqlite3';

/** What is to be crashed, and how. */
export interface CrashRound {
  folder: string;
  synchronous: 'FULL' | 'NORMAL';
  /** The process is killed as soon as it has acknowledged this many. */
  acknowledgements: number;
  /** Library that keeps what was synced; without it only the process dies, not the machine. */
  powerCutLibrary?: string;
}

/** What was found after a crash. */
export interface AfterCrash {
  /** The numbers that were acknowledged before the crash and are not there after it. */
  lost: number[];
  acknowledged: number;
  integrity: string;
  /** Rows of the change table against the counter written in the same transactions. */
  isHalfApplied: boolean;
}

const databaseName = 'crash.sqlite';

/** Builds the library that remembers what was synced. */
export function buildPowerCutLibrary(folder: string): string {
  const library = path.join(folder, 'power-cut.so');
  execFileSync(process.env.CC ?? 'gcc', [
    '-shared',
    '-fPIC',
    '-O1',
    '-o',
    library,
    path.join(__dirname, 'power-cut.c'),
    '-ldl',
  ]);
  return library;
}

/** What a process is started with so that it leaves behind only what a power cut would. */
export function powerCutVariables(round: Pick<CrashRound, 'folder' | 'powerCutLibrary'>): NodeJS.ProcessEnv {
  const { folder, powerCutLibrary } = round;
  return powerCutLibrary === undefined ? {} : { LD_PRELOAD: powerCutLibrary, POWER_CUT_FOLDER: folder };
}

/** One round: write, crash, lose what a crash of that kind loses, open again and look. */
export async function crashOnce(round: CrashRound): Promise<AfterCrash> {
  if (round.powerCutLibrary !== undefined) keepWhatIsThere(round.folder);
  const acknowledged = await writeUntilKilled(round);
  if (round.powerCutLibrary !== undefined) cutPower(round.folder);
  return look(path.join(round.folder, databaseName), acknowledged);
}

/** Everything that reached the pipe counts as acknowledged, also what came between the decision to kill and the end. */
function writeUntilKilled(round: CrashRound): Promise<number[]> {
  const script = path.join(__dirname, 'acknowledging-writer.mjs');
  const child = spawn(process.execPath, [script, path.join(round.folder, databaseName), round.synchronous], {
    stdio: ['ignore', 'pipe', 'inherit'],
    env: {
      ...process.env,
      ...powerCutVariables(round),
    },
  });
  const acknowledged: number[] = [];
  const lines = createInterface({ input: child.stdout });
  lines.on('line', (line) => {
    acknowledged.push(Number(line));
    if (acknowledged.length === round.acknowledgements) child.kill('SIGKILL');
  });
  return new Promise((resolve, reject) => {
    lines.once('close', () => {
      if (acknowledged.length < round.acknowledgements) reject(new Error('the writer ended by itself'));
      else resolve(acknowledged);
    });
    child.once('error', reject);
  });
}

const isOurs = (name: string) => name.endsWith('.so') || name.endsWith('.synced');

/** Files that a crash of this kind can harm: everything that lies in the folder itself but what the trial puts there. */
function filesIn(folder: string): string[] {
  return readdirSync(folder, { withFileTypes: true })
    .filter((entry) => entry.isFile() && !isOurs(entry.name))
    .map(({ name }) => path.join(folder, name));
}

/** What lies on the disk before a round is synced already. */
export function keepWhatIsThere(folder: string): void {
  for (const file of filesIn(folder)) copyFileSync(file, `${file}.synced`);
}

/** Puts what was synced in the place of what was written; what never was synced is gone. */
export function cutPower(folder: string): void {
  for (const file of filesIn(folder)) {
    rmSync(file);
    if (existsSync(`${file}.synced`)) renameSync(`${file}.synced`, file);
  }
}

function look(file: string, acknowledged: readonly number[]): AfterCrash {
  const database = new Database(file);
  try {
    const kept = new Set(database.prepare('SELECT number FROM change').pluck().all());
    const counter = database.prepare(`SELECT value FROM counter WHERE name = 'change'`).pluck().get();
    return {
      lost: acknowledged.filter((number) => !kept.has(number)),
      acknowledged: acknowledged.length,
      integrity: String(database.pragma('integrity_check', { simple: true })),
      isHalfApplied: (counter ?? 0) !== kept.size,
    };
  } finally {
    database.close();
  }
}
