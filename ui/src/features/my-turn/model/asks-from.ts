import type { WireTurn } from '@stubpost/shared';

/** Something that waits for one person's yes or no. */
export type AskOfPerson =
  | { kind: 'relief'; relief: NonNullable<WireTurn['reliefs']>[number] }
  | { kind: 'radio'; asked: NonNullable<WireTurn['asksAgreement']>[number] };

/** What waits for a person: the reliefs that await their word, then, for the crew of the turn, the steps by radio. */
export function asksFrom(turn: WireTurn, personId: string): AskOfPerson[] {
  const reliefs = (turn.reliefs ?? []).filter(({ awaits }) => awaits === personId);
  const isCrew = turn.crew.some((member) => member.personId === personId);
  const asked = isCrew ? (turn.asksAgreement ?? []) : [];
  return [
    ...reliefs.map((relief): AskOfPerson => ({ kind: 'relief', relief })),
    ...asked.map((each): AskOfPerson => ({ kind: 'radio', asked: each })),
  ];
}
