import type { CrewMember } from '@stubpost/shared';
import { mostNames, reliefConsequence, whoFits } from './relief';

const person = (id: string, name: string, ...as: CrewMember['as']): CrewMember => ({ id, name, as });
const people = [
  person('1', 'Ortiz', 'conductor'),
  person('2', 'Osei', 'engineer'),
  person('3', 'Brandis', 'conductor', 'engineer'),
  person('4', 'Adebari', 'conductor'),
];

describe('who may take over', () => {
  it('are the others of the same craft, by name', () => {
    const { shown } = whoFits(people, { role: 'conductor', typed: '', notId: '1' });
    expect(shown.map(({ name }) => name)).toEqual(['Adebari', 'Brandis']);
  });

  it('are found by a part of the name, whatever the case', () => {
    expect(whoFits(people, { role: 'engineer', typed: ' SE', notId: '1' }).shown.map(({ id }) => id)).toEqual(
      ['2'],
    );
    expect(whoFits(people, { role: 'engineer', typed: 'xyz', notId: '1' })).toEqual({
      shown: [],
      words: 'No engineer of this terminal fits.',
    });
  });

  it('are found by the badge', () => {
    const withBadge = [{ ...person('5', 'Lislet', 'conductor'), badge: 'C-207' }];
    expect(whoFits(withBadge, { role: 'conductor', typed: 'c-20', notId: '1' }).shown).toHaveLength(1);
  });

  it('are shown a few at a time, and the rest is counted', () => {
    const many = Array.from({ length: mostNames + 3 }, (_, at) =>
      person(`p${at}`, `Name ${at}`, 'conductor'),
    );
    const found = whoFits(many, { role: 'conductor', typed: '', notId: '' });
    expect(found.shown).toHaveLength(mostNames);
    expect(found.words).toBe('3 more: type a part of the name.');
  });
});

it('only the relief of an engineer touches the brake tests', () => {
  expect(reliefConsequence('engineer')).toMatch(/Class II .* 238\.317/);
  expect(reliefConsequence('conductor')).toMatch(/no brake test/);
});
