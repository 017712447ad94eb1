import type { CrewRole } from '@stubpost/shared';
import { Column, Entity, Index, PrimaryColumn } from 'typeorm';
import { instantColumn, jsonColumn, nullableInstantColumn } from '../database/columns';

/** A person on a turn, with the name of the day. */
export interface CrewMemberOfTurn {
  as: CrewRole;
  personId: string;
  name: string;
}

/**
 * One turn: what was planned, the plan version it is measured against, and copies of what its entries say, so that
 * boards, history and searches need not read the log. The entries decide; the copies follow them in the same
 * transaction.
 */
@Entity('turn')
@Index('turn_day', ['terminalCode', 'serviceDate'])
@Index('turn_span', ['terminalCode', 'spanTo'])
@Index('turn_unsettled', ['spanFrom'], { where: '"settled_at" IS NULL' })
@Index('turn_set', ['set', 'spanFrom'])
@Index('turn_corrections', ['terminalCode', 'waitingCount'], { where: '"correction_count" > 0' })
@Index('turn_pair', ['terminalCode', 'serviceDate', 'pairKey'], {
  unique: true,
  where: '"pair_key" IS NOT NULL',
})
export class TurnRow {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'integer' })
  version: number;

  @Column({ name: 'terminal_code', type: 'text' })
  terminalCode: string;

  /** IANA zone of the service date. */
  @Column({ type: 'text' })
  zone: string;

  @Column({ name: 'service_date', type: 'text' })
  serviceDate: string;

  @Column({ type: 'text' })
  kind: string;

  /** `timetable` or `extra`. */
  @Column({ type: 'text' })
  origin: string;

  @Column({ name: 'timetable_id', type: 'text', nullable: true })
  timetableId: string | null;

  /** Names the pair of trips inside its service date, so that a second opening finds the same turn. */
  @Column({ name: 'pair_key', type: 'text', nullable: true })
  pairKey: string | null;

  @Column({ name: 'inbound_train', type: 'text', nullable: true })
  inboundTrain: string | null;

  @Column({ name: 'outbound_train', type: 'text', nullable: true })
  outboundTrain: string | null;

  @Column(nullableInstantColumn('scheduled_arrival_at'))
  scheduledArrivalAt: number | null;

  @Column(nullableInstantColumn('scheduled_departure_at'))
  scheduledDepartureAt: number | null;

  @Column({ name: 'planned_track', type: 'text', nullable: true })
  plannedTrack: string | null;

  @Column({ name: 'planned_set', type: 'text', nullable: true })
  plannedSet: string | null;

  /** Whether the train goes back the way it came: 1, 0, or null when unknown. */
  @Column({ type: 'integer', nullable: true })
  reverses: number | null;

  @Column({ name: 'plan_id', type: 'text' })
  planId: string;

  @Column({ type: 'text', nullable: true })
  track: string | null;

  @Column({ name: 'set_label', type: 'text', nullable: true })
  set: string | null;

  @Column(nullableInstantColumn('expected_arrival_at'))
  expectedArrivalAt: number | null;

  @Column(nullableInstantColumn('arrival_at'))
  arrivalAt: number | null;

  @Column(nullableInstantColumn('held_until'))
  heldUntil: number | null;

  @Column(nullableInstantColumn('departure_at'))
  departureAt: number | null;

  @Column(nullableInstantColumn('annulled_at'))
  annulledAt: number | null;

  @Column({ name: 'entry_count', type: 'integer' })
  entryCount: number;

  /** Changes of the record that need an approval, and those of them that wait. */
  @Column({ name: 'correction_count', type: 'integer', default: 0 })
  correctionCount: number;

  @Column({ name: 'waiting_count', type: 'integer', default: 0 })
  waitingCount: number;

  @Column(jsonColumn('crew'))
  crew: CrewMemberOfTurn[];

  /** Crew of the set's turn before this one; stands until an entry of this turn says otherwise. */
  @Column(jsonColumn('carried_crew'))
  carriedCrew: CrewMemberOfTurn[];

  /** First and last instant at which the train is, or should be, at the terminal. */
  @Column(instantColumn('span_from'))
  spanFrom: number;

  @Column(instantColumn('span_to'))
  spanTo: number;

  /** From when on nothing about the turn changes by the passing of time; null while the sweep looks at it. */
  @Column(nullableInstantColumn('settled_at'))
  settledAt: number | null;

  /** Set when a timetable takes the turn back before anything has happened. */
  @Column(nullableInstantColumn('withdrawn_at'))
  withdrawnAt: number | null;

  @Column(instantColumn('created_at'))
  createdAt: number;
}
