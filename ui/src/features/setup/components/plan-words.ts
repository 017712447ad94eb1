import type { Anchor, Doer, Place, ReadingKey, StepKind } from '@stubpost/shared';

/** Words of the step-plan editor for the tokens of a plan. */
export const KIND_WORDS: Record<StepKind, string> = {
  securement: 'Securement',
  'brake-test': 'Brake test',
  ends: 'Change of ends',
  air: 'Air',
  movement: 'Movement',
  boarding: 'Boarding',
};
export const DOER_WORDS: Record<Doer, string> = {
  conductor: 'Conductor',
  engineer: 'Engineer',
  crew: 'Any crew member',
};
export const PLACE_WORDS: Record<Place, string> = { cab: 'Cab', ground: 'Ground' };
export const ANCHOR_WORDS: Record<Anchor, string> = { arrival: 'Arrival', departure: 'Departure' };
export const READING_WORDS: Record<ReadingKey, string> = {
  count: 'Handbrakes, count',
  cars: 'Handbrakes, cars',
  brakePipePsi: 'Brake-pipe pressure',
  leakage: 'Leakage test',
};

/** The entries of a word list as options of a select. */
export function optionsOf<Key extends string>(words: Record<Key, string>): { value: Key; label: string }[] {
  return (Object.keys(words) as Key[]).map((value) => ({ value, label: words[value] }));
}
