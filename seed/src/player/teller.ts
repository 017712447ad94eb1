import type { Role } from '@stubpost/shared';
import type { Act, TurnStory } from '../story/act';
import type { Cast, CastMember } from './cast';

/** Who writes an act down: the person on the turn, or the desk, which also stands for the feeds it watches over. */
export function writerOf(cast: Cast, story: TurnStory, act: Act): CastMember {
  const key = act.teller === 'conductor' || act.teller === 'engineer' ? story.crew[act.teller] : undefined;
  const member = key === undefined ? firstWith(cast, 'dispatcher') : cast.byKey.get(key);
  if (member === undefined) throw new Error(`nobody is called ${key}`);
  return member;
}

function firstWith(cast: Cast, role: Role): CastMember | undefined {
  return cast.withRole(role)[0];
}

/** The id of a person of the cast. */
export function personIdIn(cast: Cast): (key: string) => string {
  return (key) => {
    const member = cast.byKey.get(key);
    if (member === undefined) throw new Error(`nobody is called ${key}`);
    return member.id;
  };
}
