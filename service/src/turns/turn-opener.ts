import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import type { CalendarDate, Instant, PlannedOpening } from '@stubpost/shared';
import { ChangeLog } from '../database/change-log';
import type { Transaction } from '../database/unit-of-work';
import { PlansService } from '../plans/plans.service';
import type { TurnRecord } from './turn-record';
import { type TurnTimes, spanOf } from './turn-span';
import { TurnRepository } from './turn.repository';

/** Turns that a timetable plans, to be opened. The terminals must exist. */
export interface OpenTurnsCommand {
  timetableId: string;
  /** IANA zone of each terminal's clocks, by code. */
  zones: Readonly<Record<string, string>>;
  openings: readonly PlannedOpening[];
  now: Instant;
}

/** Planned turns of a day that a timetable does not have any more. */
export interface WithdrawTurnsCommand {
  terminal: string;
  serviceDate: CalendarDate;
  /** Pair keys that stay. */
  keep: readonly string[];
  now: Instant;
}

/** What became of the openings. */
export interface OpeningCounts {
  opened: number;
  /** Planned anew, or brought back after they had been taken back. */
  replanned: number;
  /** There already, as planned, or begun and therefore left alone. */
  kept: number;
}

/** How a turn is planned; the rest of its row follows from entries. */
type Plan = Pick<
  TurnRecord,
  | 'kind'
  | 'timetableId'
  | 'inboundTrain'
  | 'outboundTrain'
  | 'scheduledArrivalAt'
  | 'scheduledDepartureAt'
  | 'plannedTrack'
  | 'plannedSet'
  | 'reverses'
  | 'planId'
>;

/**
 * Opens the turns that a timetable plans, and takes back those it does not plan any more. A turn on which something
 * has happened is never touched; opening the same turns twice opens them once.
 */
@Injectable()
export class TurnOpener {
  constructor(
    private readonly turns: TurnRepository,
    private readonly plans: PlansService,
    private readonly changes: ChangeLog,
  ) {}

  async openTurns(transaction: Transaction, command: OpenTurnsCommand): Promise<OpeningCounts> {
    const counts: OpeningCounts = { opened: 0, replanned: 0, kept: 0 };
    const changed = new Set<string>();
    for (const day of byDay(command.openings)) {
      const { terminal, serviceDate } = day;
      const zone = command.zones[terminal];
      if (zone === undefined) throw new Error(`no zone was given for terminal ${terminal}`);
      const plan = await this.plans.inForce(transaction, terminal, serviceDate, command.now);
      const known = await this.turns.findPlannedOn(transaction, terminal, serviceDate);
      const byKey = new Map(known.map((turn) => [turn.pairKey, turn]));
      for (const opening of day.openings) {
        const planned = planOf(opening, { timetableId: command.timetableId, planId: plan.id });
        const turn = byKey.get(opening.pairKey) ?? null;
        const outcome = await this.open(transaction, { opening, planned, turn, zone, now: command.now });
        counts[outcome] += 1;
        if (outcome !== 'kept') changed.add(terminal);
      }
    }
    for (const terminal of changed) await this.tell(transaction, terminal, command.timetableId);
    return counts;
  }

  /** Takes back planned turns of a day on which nothing has happened; gives how many. */
  async withdrawUnstarted(transaction: Transaction, command: WithdrawTurnsCommand): Promise<number> {
    const { terminal, serviceDate, now } = command;
    const keep = new Set(command.keep);
    const known = await this.turns.findPlannedOn(transaction, terminal, serviceDate);
    const gone = known.filter(
      (turn) => turn.withdrawnAt === null && turn.entryCount === 0 && !keep.has(turn.pairKey ?? ''),
    );
    for (const turn of gone) await this.turns.follow(transaction, { ...turn, withdrawnAt: now });
    if (gone.length > 0) await this.tell(transaction, terminal, gone[0]?.timetableId ?? terminal);
    return gone.length;
  }

  private async open(
    transaction: Transaction,
    question: { opening: PlannedOpening; planned: Plan; turn: TurnRecord | null; zone: string; now: Instant },
  ): Promise<keyof OpeningCounts> {
    const { opening, planned, turn, zone, now } = question;
    if (turn === null) {
      await this.turns.insert(transaction, newTurn(opening, planned, { zone, now }));
      return 'opened';
    }
    if (turn.entryCount > 0 || (turn.withdrawnAt === null && isPlannedSo(turn, planned))) return 'kept';
    const times = { ...turn, ...planned };
    await this.turns.replan(transaction, {
      ...times,
      ...openedSpan(times, now),
      track: planned.plannedTrack,
      set: planned.plannedSet,
      withdrawnAt: null,
    });
    return 'replanned';
  }

  /** One word for all turns of a terminal: whoever looks at it loads anew. */
  private async tell(transaction: Transaction, terminalCode: string, timetableId: string): Promise<void> {
    await this.changes.append(transaction, {
      kind: 'timetable',
      objectId: timetableId,
      version: 0,
      terminalCode,
    });
  }
}

interface OpeningDay {
  terminal: string;
  serviceDate: CalendarDate;
  openings: PlannedOpening[];
}

function byDay(openings: readonly PlannedOpening[]): OpeningDay[] {
  const days = new Map<string, OpeningDay>();
  for (const opening of openings) {
    const { terminal, serviceDate } = opening;
    const key = `${terminal} ${serviceDate}`;
    const day = days.get(key) ?? { terminal, serviceDate, openings: [] };
    days.set(key, day);
    day.openings.push(opening);
  }
  return [...days.values()];
}

function planOf(opening: PlannedOpening, pinned: { timetableId: string; planId: string }): Plan {
  return {
    kind: opening.kind,
    inboundTrain: opening.inboundTrain,
    outboundTrain: opening.outboundTrain,
    scheduledArrivalAt: opening.scheduledArrivalAt,
    scheduledDepartureAt: opening.scheduledDepartureAt,
    plannedTrack: opening.track,
    plannedSet: opening.block,
    reverses: opening.reverses,
    ...pinned,
  };
}

/** Whether a turn is planned like this already; which timetable says so makes no difference. */
function isPlannedSo(turn: TurnRecord, planned: Plan): boolean {
  const { timetableId: _, ...rest } = planned;
  return (Object.keys(rest) as (keyof typeof rest)[]).every((field) => turn[field] === rest[field]);
}

function newTurn(
  opening: PlannedOpening,
  planned: Plan,
  context: { zone: string; now: Instant },
): TurnRecord {
  const times = { ...planned, expectedArrivalAt: null, arrivalAt: null, heldUntil: null, departureAt: null };
  return {
    id: randomUUID(),
    version: 1,
    terminalCode: opening.terminal,
    zone: context.zone,
    serviceDate: opening.serviceDate,
    origin: 'timetable',
    pairKey: opening.pairKey,
    track: planned.plannedTrack,
    set: planned.plannedSet,
    annulledAt: null,
    entryCount: 0,
    correctionCount: 0,
    waitingCount: 0,
    crew: [],
    carriedCrew: [],
    ...times,
    ...openedSpan(times, context.now),
    withdrawnAt: null,
    createdAt: context.now,
  };
}

/** A turn that is opened after its time is left alone until somebody records something: nobody can act on it any more. */
function openedSpan(times: TurnTimes, now: Instant): Pick<TurnRecord, 'spanFrom' | 'spanTo' | 'settledAt'> {
  const span = spanOf(times);
  return { ...span, settledAt: span.spanTo < now ? now : null };
}
