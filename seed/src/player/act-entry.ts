import { formatInstant, type RecordEntryRequest } from '@stubpost/shared';
import type { Act } from '../story/act';
import { entryIdOf } from './entry-id';

/** Names an act inside its turn: no turn has the same step, or the same kind of news, twice in a story. */
function nameOf(act: Act): string {
  const { content } = act;
  if ('step' in content) return `${content.kind} ${content.step}`;
  return content.kind === 'crew' ? `crew ${content.as}` : content.kind;
}

/** The id that an act's entry has in a turn. */
export function actEntryId(turnId: string, act: Act): string {
  return entryIdOf(`${turnId} ${nameOf(act)}`);
}

/** The id of the entry in which a story tells of a step. */
export function stepEntryId(turnId: string, step: string): string {
  return entryIdOf(`${turnId} step-done ${step}`);
}

/** The request that a phone, the desk or a feed would send for an act. `personIdOf` turns keys of people into ids. */
export function actRequest(
  turnId: string,
  act: Act,
  personIdOf: (key: string) => string,
): RecordEntryRequest {
  const base = {
    id: actEntryId(turnId, act),
    observedAt: formatInstant(act.observedAt),
    source: act.source,
    ...(act.saidBy === undefined ? {} : { saidBy: act.saidBy }),
  };
  const { content } = act;
  if (content.kind === 'agreed')
    return { ...base, kind: content.kind, target: stepEntryId(turnId, content.step) };
  if (content.kind === 'corrected') {
    const { kind, step, correctedAt, reason } = content;
    const { observedAt: madeAt, ...facts } = base;
    const target = stepEntryId(turnId, step);
    return { ...facts, kind, target, madeAt, observedAt: formatInstant(correctedAt), reason };
  }
  if (content.kind === 'crew') return { ...base, ...content, person: personIdOf(content.person) };
  if (content.kind === 'expected-arrival')
    return { ...base, kind: content.kind, expectedAt: formatInstant(content.expectedAt) };
  return { ...base, ...content };
}
