import { putSetSchema, type WireSet } from '@stubpost/shared';
import { draftOfSet, newUnitDraft, readSet, setSummary, type SetDraft, type UnitDraft } from './set-draft';

let made = 0;
const makeId = (): string => `row-${(made += 1)}`;
const set: WireSet = {
  id: 'set-41',
  version: 2,
  label: '41',
  units: [
    { number: '1501', kind: 'cab-car', lengthFeet: 85, tons: 55.5, handbrakePounds: null },
    { number: '1402', kind: 'coach', lengthFeet: null, tons: null, handbrakePounds: null },
  ],
  leadingUnit: '1501',
  offAirSince: null,
};
const draft = (): SetDraft => draftOfSet(set, makeId);
const withUnit = (change: Partial<UnitDraft>): SetDraft => {
  const base = draft();
  return { ...base, units: base.units.map((unit, index) => (index === 1 ? { ...unit, ...change } : unit)) };
};
const words = (of: SetDraft): string[] =>
  readSet(of).problems.map((problem) => `${problem.field}: ${problem.words}`);

describe('a set being edited', () => {
  it('reads back as it was', () => {
    const { request, problems } = readSet(draft());
    expect(problems).toEqual([]);
    expect(request).toEqual({ units: set.units, leadingUnit: '1501' });
    expect(putSetSchema.safeParse({ version: 2, ...request }).success).toBe(true);
  });

  it('keeps its leading unit when that is renumbered, and has none when it goes', () => {
    const base = draft();
    const renamed = {
      ...base,
      units: base.units.map((unit, index) => (index === 0 ? { ...unit, number: '1599' } : unit)),
    };
    expect(readSet(renamed).request.leadingUnit).toBe('1599');
    expect(readSet({ ...base, units: base.units.slice(1) }).request.leadingUnit).toBeNull();
  });

  it('says what is wrong beside the field', () => {
    expect(words(withUnit({ number: '1501' }))).toEqual(['number: 1501 stands in the set twice.']);
    expect(words(withUnit({ number: ' ', tons: '0', lengthFeet: 'long' }))).toEqual([
      'number: Number: 1 to 20 characters.',
      'lengthFeet: Length in feet: more than 0, at most 500.',
      'tons: Tons: more than 0, at most 1000.',
    ]);
    expect(words({ ...draft(), label: '' })).toEqual(['label: Set: a label of at most 20 characters.']);
    expect(newUnitDraft('x').number).toBe('');
  });

  it('is told in one line', () => {
    expect(setSummary(set)).toBe('2 units: 1501, 1402');
    expect(setSummary({ ...set, units: [] })).toBe('0 units');
  });
});
