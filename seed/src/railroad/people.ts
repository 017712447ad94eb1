import type { Role } from '@stubpost/shared';

/** An invented person of the demo. `shown` ones stand on the sign-in page, one of each role. */
export interface DemoPerson {
  key: string;
  name: string;
  role: Role;
  terminal: string;
  shown: boolean;
}

const person = (name: string, role: Role, terminal = '*', shown = false): DemoPerson => ({
  key: name.toLowerCase().replace(/[^a-z]+/g, '.'),
  name,
  role,
  terminal,
  shown,
});

const surnames = [
  ['Tolvane', 'Quell', 'Ismay', 'Farrowby', 'Nakoma', 'Lindqual', 'Osterby'],
  ['Perrine', 'Wexcombe', 'Adebari', 'Sorrow', 'Mendip', 'Castellane', 'Harrowmere'],
  ['Brandis', 'Yunely', 'Vargo', 'Kindlay', 'Ashgrave', 'Okonjar', 'Pellerine'],
  ['Strandal', 'Moravine', 'Dunleigh', 'Hartwale', 'Corvane', 'Lislet', 'Thackray'],
].flat();

/** 28 of each craft: enough for thirteen sets in two shifts. Initials run through the alphabet. */
const crew = (role: 'conductor' | 'engineer', shift: number): DemoPerson[] =>
  surnames.map((_, index) => {
    const initial = String.fromCharCode(65 + ((index + shift) % 26));
    return person(`${initial}. ${surnames[(index * 5 + shift) % surnames.length]}`, role, '*', index === 0);
  });

export const demoPeople: readonly DemoPerson[] = [
  ...crew('conductor', 0),
  ...crew('engineer', 11),
  person('S. Halloway', 'dispatcher', '*', true),
  person('R. Brandreth', 'dispatcher', 'OSQ'),
  person('M. Reyald', 'supervisor', '*', true),
  person('J. Ansell', 'inspector', '*', true),
  person('T. Amund', 'planner', '*', true),
  person('D. Oyelan', 'analyst', '*', true),
  person('P. Whitmoor', 'auditor', '*', true),
  person('E. Vantreel', 'administrator', '*', true),
];
