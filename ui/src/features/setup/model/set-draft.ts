import { UNIT_KINDS, type PutSetRequest, type UnitKind, type WireSet, type WireUnit } from '@stubpost/shared';

export const unitKindWords: Record<UnitKind, string> = {
  locomotive: 'Locomotive',
  coach: 'Coach',
  'cab-car': 'Cab car',
  'multiple-unit': 'Multiple unit',
};

/** Kinds in the order of the list to choose from. */
export const unitKinds = UNIT_KINDS;

/** A vehicle while it is edited. */
export interface UnitDraft {
  id: string;
  number: string;
  kind: UnitKind;
  lengthFeet: string;
  tons: string;
  handbrakePounds: string;
}

/** A set while it is edited. `leadingUnit` is a row's id; empty while it is not known. */
export interface SetDraft {
  label: string;
  units: UnitDraft[];
  leadingUnit: string;
}

export type UnitField = Exclude<keyof UnitDraft, 'id' | 'kind'>;

/** Something to mend; `unitId` null for the set's own label. */
export interface SetProblem {
  unitId: string | null;
  field: UnitField | 'label';
  words: string;
}

const text = (value: number | null | undefined): string =>
  value === null || value === undefined ? '' : String(value);

/** A set, ready to be edited. `makeId` gives the rows ids of their own. */
export function draftOfSet(set: WireSet, makeId: () => string): SetDraft {
  const units = set.units.map((unit): UnitDraft => ({
    id: makeId(),
    number: unit.number,
    kind: unit.kind,
    lengthFeet: text(unit.lengthFeet),
    tons: text(unit.tons),
    handbrakePounds: text(unit.handbrakePounds),
  }));
  return {
    label: set.label,
    units,
    leadingUnit: units.find(({ number }) => number === set.leadingUnit)?.id ?? '',
  };
}

/** An empty row. */
export function newUnitDraft(id: string): UnitDraft {
  return { id, number: '', kind: 'coach', lengthFeet: '', tons: '', handbrakePounds: '' };
}

const limits: Record<Exclude<UnitField, 'number'>, { name: string; highest: number }> = {
  lengthFeet: { name: 'Length in feet', highest: 500 },
  tons: { name: 'Tons', highest: 1000 },
  handbrakePounds: { name: 'Handbrake in pounds', highest: 1_000_000 },
};

const longestName = 20;

/** A set as typed, and everything that is wrong with it in the order of the rows. */
export function readSet(draft: SetDraft): {
  request: Omit<PutSetRequest, 'version'>;
  problems: SetProblem[];
} {
  const problems: SetProblem[] = [];
  const label = draft.label.trim();
  if (label === '' || label.length > longestName)
    problems.push({ unitId: null, field: 'label', words: 'Set: a label of at most 20 characters.' });
  const units = draft.units.map((unit) => readUnit(unit, draft.units, problems));
  const leading = draft.units.find(({ id }) => id === draft.leadingUnit)?.number.trim();
  return { request: { units, leadingUnit: leading ?? null }, problems };
}

function readUnit(draft: UnitDraft, all: readonly UnitDraft[], problems: SetProblem[]): WireUnit {
  const say = (field: UnitField, words: string): void => {
    problems.push({ unitId: draft.id, field, words });
  };
  const number = draft.number.trim();
  if (number === '' || number.length > longestName) say('number', 'Number: 1 to 20 characters.');
  const first = all.find((other) => other.number.trim() === number);
  if (number !== '' && first !== undefined && first.id !== draft.id)
    say('number', `${number} stands in the set twice.`);
  const read = (field: Exclude<UnitField, 'number'>): number | null => {
    const typed = draft[field].trim();
    if (typed === '') return null;
    const value = Number(typed);
    if (Number.isFinite(value) && value > 0 && value <= limits[field].highest) return value;
    say(field, `${limits[field].name}: more than 0, at most ${limits[field].highest}.`);
    return null;
  };
  return {
    number,
    kind: draft.kind,
    lengthFeet: read('lengthFeet'),
    tons: read('tons'),
    handbrakePounds: read('handbrakePounds'),
  };
}

/** A set in one line: "8 units: 1501, 1402, …". */
export function setSummary(set: WireSet): string {
  const numbers = set.units.map(({ number }) => number);
  return `${numbers.length} ${numbers.length === 1 ? 'unit' : 'units'}${numbers.length === 0 ? '' : `: ${numbers.join(', ')}`}`;
}
