import { formatInstant } from '../lib/instant';
import type { Account } from '../turn/account';
import type { Answer } from '../turn/answers';
import type { RecordCorrection } from '../turn/corrections';
import type { ReliefFact } from '../turn/crew';
import type { InQuestion, TurnFacts } from '../turn/facts';
import type { DefectReport, TieUp } from '../turn/remarks';
import type { WireCorrection, WireTurnMatters } from './turn-matters';

type Each<Field extends keyof WireTurnMatters> =
  NonNullable<WireTurnMatters[Field]> extends (infer One)[] ? One : never;

/** The matters of a turn as the wire carries them: only those fields that say something. */
export function turnMattersOf(facts: TurnFacts): WireTurnMatters {
  const { tiedUp } = facts;
  return {
    ...unlessEmpty('inQuestion', facts.inQuestion.map(questionOf)),
    ...unlessEmpty('asksAgreement', facts.asksAgreement.map(unansweredOf)),
    ...unlessEmpty('corrections', facts.corrections.map(wireCorrectionOf)),
    ...unlessEmpty('defects', facts.defects.map(defectOf)),
    ...(tiedUp === null ? {} : { tiedUp: tieUpOf(tiedUp) }),
    ...unlessEmpty('briefedBy', briefedBy(facts)),
    ...unlessEmpty('reliefs', reliefsOf(facts.reliefs)),
  };
}

function unlessEmpty<Key extends keyof WireTurnMatters>(
  key: Key,
  items: Each<Key>[],
): { [key in Key]?: Each<Key>[] } {
  return items.length === 0 ? {} : ({ [key]: items } as { [key in Key]?: Each<Key>[] });
}

function accountOf({ entryId, at, source, by, saidBy }: Account) {
  return { entryId, at: formatInstant(at), source, by: by?.name ?? null, saidBy };
}

function questionOf({ step, accounts, objections }: InQuestion): Each<'inQuestion'> {
  return {
    step,
    accounts: accounts.map(accountOf),
    ...(objections.length === 0 ? {} : { objections: objections.map(objectionOf) }),
  };
}

function objectionOf({ entryId, target, at, by, reason }: Answer) {
  return { entryId, target, at: formatInstant(at), by: by?.name ?? null, reason: reason ?? '' };
}

function unansweredOf({ step, account }: TurnFacts['asksAgreement'][number]): Each<'asksAgreement'> {
  const { entryId, at, saidBy, by } = accountOf(account);
  return { entryId, step, at, saidBy, by };
}

function wireCorrectionOf(correction: RecordCorrection): WireCorrection {
  const { entryId, target, kind, what, oldReading, newReading, by, reason, state, decision } = correction;
  const decided = decision === null ? {} : { decidedBy: decision.by, decidedAt: formatInstant(decision.at) };
  const because = decision?.reason ?? null;
  return {
    ...{ entryId, target, kind, what, oldReading, newReading, by, reason, state },
    oldAt: formatInstant(correction.oldAt),
    newAt: correction.newAt === null ? null : formatInstant(correction.newAt),
    askedAt: formatInstant(correction.askedAt),
    ...decided,
    ...(because === null ? {} : { declinedBecause: because }),
  };
}

function defectOf({ entryId, at, by, car, cause, note }: DefectReport): Each<'defects'> {
  return { entryId, at: formatInstant(at), by, car, cause, ...(note === null ? {} : { note }) };
}

function tieUpOf(tieUp: TieUp): NonNullable<WireTurnMatters['tiedUp']> {
  const { entryId, at, by, handbrakes, checks, offAir, reason } = tieUp;
  return {
    ...{ entryId, at: formatInstant(at), by, handbrakes, checks: [...checks] },
    ...(offAir ? { offAir } : {}),
    ...(reason === null ? {} : { reason }),
  };
}

function briefedBy({ briefings }: TurnFacts): string[] {
  return [...new Set(briefings.flatMap((briefing) => briefing.by?.personId ?? []))];
}

/** Each change of crew once, also where both who took part wrote it down. */
function reliefsOf(reliefs: readonly ReliefFact[]): Each<'reliefs'>[] {
  const seen = new Set<string>();
  return reliefs.flatMap((relief) => {
    const { entryId, at, as, out, faceToFace, awaits } = relief;
    if (out === null) return [];
    const key = JSON.stringify([as, out.personId, relief.in?.personId ?? null]);
    if (seen.has(key)) return [];
    seen.add(key);
    return [{ entryId, at: formatInstant(at), as, out, in: relief.in, faceToFace, awaits }];
  });
}
