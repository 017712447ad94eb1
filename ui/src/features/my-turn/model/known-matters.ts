import { turnMattersOf, type RecordEntryRequest, type TurnFacts, type WireTurn } from '@stubpost/shared';
import type { Writer } from './wire-entries';

/**
 * What people still have to settle about a turn, with the entries under way put in: answers given, corrections asked
 * for, defects, a tie-up, the briefing. Reliefs stay as the service told them, but for this person's own answers.
 */
export function withMatters(
  turn: WireTurn,
  after: TurnFacts,
  waiting: readonly RecordEntryRequest[],
  writer: Writer,
): WireTurn {
  const { reliefs: _byService, ...matters } = turnMattersOf(after);
  const {
    inQuestion: _inQuestion,
    asksAgreement: _asksAgreement,
    corrections: _corrections,
    defects: _defects,
    tiedUp: _tiedUp,
    briefedBy: _briefedBy,
    reliefs,
    ...bare
  } = turn;
  const answered = reliefs?.map((relief) => {
    const answer = waiting.find(
      (request) =>
        (request.kind === 'agreed' || request.kind === 'disagreed') && request.target === relief.entryId,
    );
    return answer === undefined || relief.awaits !== writer.id
      ? relief
      : { ...relief, awaits: null, faceToFace: answer.kind === 'agreed' };
  });
  return { ...bare, ...matters, ...(answered === undefined ? {} : { reliefs: answered }) };
}

/**
 * The crew with what this phone is still to send. Somebody who takes over from the writer has no name here before the
 * receipt brings it; until then the job stands empty.
 */
export function withCrewUnderWay(
  turn: WireTurn,
  waiting: readonly RecordEntryRequest[],
  writer: Writer,
): WireTurn {
  return waiting.reduce((known, request) => {
    const comes =
      request.kind === 'crew' ? request.person : request.kind === 'relief' ? (request.in ?? null) : undefined;
    if (comes === undefined || (request.kind !== 'crew' && request.kind !== 'relief')) return known;
    if (request.kind === 'crew' && comes !== writer.id) return known;
    const others = known.crew.filter((member) => member.as !== request.as);
    const own = comes === writer.id ? [{ as: request.as, personId: writer.id, name: writer.name }] : [];
    return { ...known, crew: [...others, ...own] };
  }, turn);
}
