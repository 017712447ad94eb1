import { readFileSync, readdirSync } from 'node:fs';

function readStat(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    // The second field is the command in brackets and may itself hold blanks and brackets.
    return stat.slice(stat.lastIndexOf(')') + 2).split(' ');
  } catch {
    return undefined;
  }
}

/**
 * When a process began, in the kernel's own ticks: together with the number it names one process for good, since
 * numbers are used again. Empty where the system keeps no /proc.
 */
export function startMark(pid) {
  return readStat(pid)?.[19] ?? '';
}

export function isRunning(pid) {
  const stat = readStat(pid);
  if (stat !== undefined) return stat[0] !== 'Z';
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return error.code === 'EPERM';
  }
}

/** Children, their children and so on, of one process; empty where the system keeps no /proc. */
export function descendantsOf(ancestor) {
  const parents = new Map();
  for (const name of listProc()) {
    const parent = readStat(name)?.[1];
    if (parent !== undefined) parents.set(Number(name), Number(parent));
  }
  const found = new Set([ancestor]);
  // A parent may stand behind its child in the table, so go round until nothing new turns up.
  for (let before = 0; before !== found.size;) {
    before = found.size;
    for (const [pid, parent] of parents) if (found.has(parent)) found.add(pid);
  }
  found.delete(ancestor);
  return [...found];
}

function listProc() {
  try {
    return readdirSync('/proc').filter((name) => /^\d+$/.test(name));
  } catch {
    return [];
  }
}
