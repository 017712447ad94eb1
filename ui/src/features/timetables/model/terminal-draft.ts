import {
  activationSchema,
  type ActivationRequest,
  type CalendarDate,
  type WireStationSummary,
  type WireTerminalChoice,
} from '@stubpost/shared';

/** What stands in one row of the choice: whether the station counts, and which terminal it is part of. */
export interface StationDraft {
  stationId: string;
  chosen: boolean;
  /** Stations with one code make one terminal. */
  code: string;
  name: string;
}

/** Rows as they are first shown: stations that the terminals named so far are made of are chosen already. */
export function draftFrom(
  stations: readonly WireStationSummary[],
  known: readonly WireTerminalChoice[],
): StationDraft[] {
  return stations.map(({ stationId, name }) => {
    const terminal = known.find(({ stationIds }) => stationIds.includes(stationId));
    return terminal === undefined
      ? { stationId, chosen: false, code: '', name }
      : { stationId, chosen: true, code: terminal.code, name: terminal.name };
  });
}

/** A code to begin with: the first letters of the name, with a number where another terminal has them. */
export function suggestCode(name: string, taken: readonly string[]): string {
  const letters =
    name
      .toUpperCase()
      .replace(/[^A-Z0-9]/g, '')
      .slice(0, 3) || 'T';
  const free = (code: string): boolean => !taken.includes(code);
  if (free(letters)) return letters;
  let number = 2;
  while (!free(`${letters}${number}`)) number += 1;
  return `${letters}${number}`;
}

/** Puts a station in or takes it out; a station that comes in gets a code. */
export function setChosen(
  draft: readonly StationDraft[],
  stationId: string,
  chosen: boolean,
): StationDraft[] {
  const taken = draft.filter((row) => row.chosen).map((row) => row.code);
  return draft.map((row) => {
    if (row.stationId !== stationId) return row;
    return { ...row, chosen, code: chosen && row.code === '' ? suggestCode(row.name, taken) : row.code };
  });
}

/** Changes the code of one station. One that takes the code of another becomes part of its terminal and bears its name. */
export function setCode(draft: readonly StationDraft[], stationId: string, code: string): StationDraft[] {
  const other = draft.find(
    (row) => row.chosen && row.stationId !== stationId && row.code === code && code !== '',
  );
  return draft.map((row) =>
    row.stationId === stationId ? { ...row, code, name: other?.name ?? row.name } : row,
  );
}

/** Names a terminal: all its stations. */
export function setName(draft: readonly StationDraft[], stationId: string, name: string): StationDraft[] {
  const code = draft.find((row) => row.stationId === stationId)?.code;
  return draft.map((row) =>
    row.stationId === stationId || (row.chosen && row.code === code && code !== '') ? { ...row, name } : row,
  );
}

/** The chosen stations gathered into terminals, in the order of the rows. */
export function terminalsOf(draft: readonly StationDraft[]): WireTerminalChoice[] {
  const terminals = new Map<string, WireTerminalChoice>();
  for (const { chosen, code, name, stationId } of draft) {
    if (!chosen) continue;
    const key = code.trim();
    const terminal = terminals.get(key);
    if (terminal === undefined) terminals.set(key, { code: key, name: name.trim(), stationIds: [stationId] });
    else terminal.stationIds.push(stationId);
  }
  return [...terminals.values()];
}

/** Something to mend before the timetable can be made active. */
export interface DraftProblem {
  /** Field it is about: a row's code or name, or the date. */
  fieldId: string;
  words: string;
}

/** Ids of the fields, for labels and for links from the list of problems. */
export const codeFieldId = (stationId: string): string => `code-${stationId}`;
export const nameFieldId = (stationId: string): string => `name-${stationId}`;
export const choiceId = 'choice-of-terminals';
export const fromFieldId = 'active-from';

export interface ActivationDraft {
  stations: readonly StationDraft[];
  from: CalendarDate | null;
  acceptGuesses: boolean;
}

/** The request, or what is to be mended first. */
export function activationFrom(
  draft: ActivationDraft,
): { request: ActivationRequest; problems: [] } | { request: null; problems: DraftProblem[] } {
  const terminals = terminalsOf(draft.stations);
  const request = { from: draft.from ?? '', terminals, acceptGuesses: draft.acceptGuesses };
  const parsed = activationSchema.safeParse(request);
  if (parsed.success) return { request: parsed.data, problems: [] };
  const problems = parsed.error.issues.map(({ path }) => problemAt(path, terminals));
  return {
    request: null,
    problems: [...new Map(problems.map((problem) => [problem.fieldId, problem])).values()],
  };
}

function problemAt(path: readonly PropertyKey[], terminals: readonly WireTerminalChoice[]): DraftProblem {
  const [part, index, field] = path;
  if (part === 'from') return { fieldId: fromFieldId, words: 'Active from: no date that exists.' };
  const terminal = typeof index === 'number' ? terminals[index] : undefined;
  const stationId = terminal?.stationIds[0];
  if (terminal === undefined || stationId === undefined) {
    return { fieldId: choiceId, words: 'No terminal is chosen.' };
  }
  if (field === 'name')
    return { fieldId: nameFieldId(stationId), words: `Terminal ${terminal.code} has no name.` };
  return {
    fieldId: codeFieldId(stationId),
    words: `${terminal.name || 'A terminal'}: a code is 1 to 12 letters, digits or dashes.`,
  };
}
