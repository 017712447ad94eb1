import type { CalendarDate, Instant, TurnKind } from '@stubpost/shared';
import type { CrewMemberOfTurn } from './turn.entity';

/** Where a turn came from. */
export type TurnOrigin = 'timetable' | 'extra';

/** One row of the table of turns, read. */
export interface TurnRecord {
  id: string;
  version: number;
  terminalCode: string;
  zone: string;
  serviceDate: CalendarDate;
  kind: TurnKind;
  origin: TurnOrigin;
  timetableId: string | null;
  pairKey: string | null;
  inboundTrain: string | null;
  outboundTrain: string | null;
  scheduledArrivalAt: Instant | null;
  scheduledDepartureAt: Instant | null;
  plannedTrack: string | null;
  plannedSet: string | null;
  reverses: boolean | null;
  planId: string;
  track: string | null;
  set: string | null;
  expectedArrivalAt: Instant | null;
  arrivalAt: Instant | null;
  heldUntil: Instant | null;
  departureAt: Instant | null;
  annulledAt: Instant | null;
  entryCount: number;
  correctionCount: number;
  waitingCount: number;
  crew: CrewMemberOfTurn[];
  carriedCrew: CrewMemberOfTurn[];
  spanFrom: Instant;
  spanTo: Instant;
  settledAt: Instant | null;
  withdrawnAt: Instant | null;
  createdAt: Instant;
}

/** A row as the driver hands it over: text, numbers and nulls under column names. */
export type RawTurn = Record<string, string | number | null>;

/** Property and column of each field, in the order of the INSERT. */
export const turnColumns = [
  ['id', 'id'],
  ['version', 'version'],
  ['terminalCode', 'terminal_code'],
  ['zone', 'zone'],
  ['serviceDate', 'service_date'],
  ['kind', 'kind'],
  ['origin', 'origin'],
  ['timetableId', 'timetable_id'],
  ['pairKey', 'pair_key'],
  ['inboundTrain', 'inbound_train'],
  ['outboundTrain', 'outbound_train'],
  ['scheduledArrivalAt', 'scheduled_arrival_at'],
  ['scheduledDepartureAt', 'scheduled_departure_at'],
  ['plannedTrack', 'planned_track'],
  ['plannedSet', 'planned_set'],
  ['reverses', 'reverses'],
  ['planId', 'plan_id'],
  ['track', 'track'],
  ['set', 'set_label'],
  ['expectedArrivalAt', 'expected_arrival_at'],
  ['arrivalAt', 'arrival_at'],
  ['heldUntil', 'held_until'],
  ['departureAt', 'departure_at'],
  ['annulledAt', 'annulled_at'],
  ['entryCount', 'entry_count'],
  ['correctionCount', 'correction_count'],
  ['waitingCount', 'waiting_count'],
  ['crew', 'crew'],
  ['carriedCrew', 'carried_crew'],
  ['spanFrom', 'span_from'],
  ['spanTo', 'span_to'],
  ['settledAt', 'settled_at'],
  ['withdrawnAt', 'withdrawn_at'],
  ['createdAt', 'created_at'],
] as const satisfies readonly (readonly [keyof TurnRecord, string])[];

const instant = (value: RawTurn[string] | undefined): Instant | null =>
  value === null || value === undefined ? null : Number(value);
const text = (value: RawTurn[string] | undefined): string | null =>
  value === null || value === undefined ? null : String(value);
const crewOf = (value: RawTurn[string] | undefined): CrewMemberOfTurn[] =>
  value === '[]' ? [] : (JSON.parse(String(value)) as CrewMemberOfTurn[]);

/** Reads a raw row. */
export function turnRecordOf(raw: RawTurn): TurnRecord {
  return {
    id: String(raw['id']),
    version: Number(raw['version']),
    terminalCode: String(raw['terminal_code']),
    zone: String(raw['zone']),
    serviceDate: String(raw['service_date']),
    kind: raw['kind'] as TurnKind,
    origin: raw['origin'] as TurnOrigin,
    timetableId: text(raw['timetable_id']),
    pairKey: text(raw['pair_key']),
    inboundTrain: text(raw['inbound_train']),
    outboundTrain: text(raw['outbound_train']),
    scheduledArrivalAt: instant(raw['scheduled_arrival_at']),
    scheduledDepartureAt: instant(raw['scheduled_departure_at']),
    plannedTrack: text(raw['planned_track']),
    plannedSet: text(raw['planned_set']),
    reverses: raw['reverses'] === null ? null : raw['reverses'] === 1,
    planId: String(raw['plan_id']),
    track: text(raw['track']),
    set: text(raw['set_label']),
    expectedArrivalAt: instant(raw['expected_arrival_at']),
    arrivalAt: instant(raw['arrival_at']),
    heldUntil: instant(raw['held_until']),
    departureAt: instant(raw['departure_at']),
    annulledAt: instant(raw['annulled_at']),
    entryCount: Number(raw['entry_count']),
    correctionCount: Number(raw['correction_count']),
    waitingCount: Number(raw['waiting_count']),
    crew: crewOf(raw['crew']),
    carriedCrew: crewOf(raw['carried_crew']),
    spanFrom: Number(raw['span_from']),
    spanTo: Number(raw['span_to']),
    settledAt: instant(raw['settled_at']),
    withdrawnAt: instant(raw['withdrawn_at']),
    createdAt: Number(raw['created_at']),
  };
}

/** A field as it goes into its column. */
export function columnValue(record: TurnRecord, property: keyof TurnRecord): string | number | null {
  const value = record[property];
  if (typeof value === 'boolean') return value ? 1 : 0;
  if (Array.isArray(value)) return JSON.stringify(value);
  return value;
}
