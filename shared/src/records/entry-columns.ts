import type { CalendarDate, Instant } from '../lib/instant';
import { parseInstant } from '../lib/instant';

/** What a table of entries repeats of the sealed body, so that entries can be searched. */
export interface EntryColumns {
  subjectKind: string;
  subjectId: string;
  kind: string;
  terminalCode: string;
  serviceDate: CalendarDate;
  observedAt: Instant;
}

/**
 * The searched columns of an entry, from its body alone: nothing in them can say anything that is not sealed. Null for
 * a body that is none of ours.
 */
export function columnsOf(body: unknown): EntryColumns | null {
  if (!isRecord(body) || !isRecord(body['subject'])) return null;
  const { subject, kind, terminal, serviceDate, observedAt } = body;
  const texts = [subject['kind'], subject['id'], kind, terminal, serviceDate];
  if (!texts.every(isText) || !isText(observedAt)) return null;
  const seenAt = parseInstant(observedAt);
  if (seenAt === null) return null;
  const [subjectKind, subjectId, ofKind, terminalCode, date] = texts as [
    string,
    string,
    string,
    string,
    string,
  ];
  return { subjectKind, subjectId, kind: ofKind, terminalCode, serviceDate: date, observedAt: seenAt };
}

const isText = (value: unknown): value is string => typeof value === 'string';

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
