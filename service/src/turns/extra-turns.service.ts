import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import {
  type CreateTurnRequest,
  type Instant,
  type TurnKind,
  calendarDateAt,
  daysBetween,
  formatInstant,
} from '@stubpost/shared';
import { Refusal } from '../common/refusal';
import { type Transaction, UnitOfWork } from '../database/unit-of-work';
import { PlansService } from '../plans/plans.service';
import { SetsService } from '../sets/sets.service';
import { TerminalsReadModel } from '../terminals/terminals.read-model';
import { TerminalsService } from '../terminals/terminals.service';
import { CrewCarrier } from './crew-carrier';
import { TurnChanges } from './turn-changes';
import { type TurnFile, turnFileFrom } from './turn-file';
import { TurnFiles } from './turn-files';
import type { TurnRecord } from './turn-record';
import { spanOf } from './turn-span';
import { TurnRepository } from './turn.repository';

/** A turn's trains may run on the day before or after its service date, not further away. */
const longestDaysFromServiceDate = 1;

/** Turns that no timetable plans, entered by hand. */
@Injectable()
export class ExtraTurns {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly turns: TurnRepository,
    private readonly files: TurnFiles,
    private readonly changes: TurnChanges,
    private readonly plans: PlansService,
    private readonly sets: SetsService,
    private readonly crews: CrewCarrier,
    private readonly terminals: TerminalsReadModel,
    private readonly terminalRows: TerminalsService,
  ) {}

  /** Enters an extra turn. An unknown track is added to the terminal; two turns on one track are a clash to show. */
  async create(request: CreateTurnRequest, now: Instant): Promise<TurnFile> {
    const terminal = await this.terminals.require(request.terminal);
    checkTimes(request, terminal.zone);
    return this.unitOfWork.run((transaction) =>
      this.createIn(transaction, request, { zone: terminal.zone, now }),
    );
  }

  private async createIn(
    transaction: Transaction,
    request: CreateTurnRequest,
    context: { zone: string; now: Instant },
  ): Promise<TurnFile> {
    const { terminal, serviceDate, track } = request;
    if (track !== undefined) await this.terminalRows.ensureTracksIn(transaction, terminal, [track]);
    const plan = await this.plans.inForce(transaction, terminal, serviceDate, context.now);
    const bare = extraTurnOf(request, { ...context, planId: plan.id });
    const carriedCrew = await this.crews.carriedInto(transaction, bare);
    const record = { ...bare, carriedCrew, crew: carriedCrew };
    await this.turns.insert(transaction, record);
    const cars = record.set === null ? [] : await this.sets.carsOf(transaction, record.set);
    const file = turnFileFrom({ record, plan, entries: [], cars, alerts: [] });
    this.files.stage(transaction, file);
    this.changes.note(transaction, record);
    await this.changes.write(transaction);
    return file;
  }
}

function checkTimes({ serviceDate, inbound, outbound }: CreateTurnRequest, zone: string): void {
  const arrivalAt = inbound === undefined ? null : Date.parse(inbound.scheduledArrivalAt);
  const departureAt = outbound === undefined ? null : Date.parse(outbound.scheduledDepartureAt);
  for (const at of [arrivalAt, departureAt]) {
    if (at === null) continue;
    const date = calendarDateAt(at, zone);
    if (Math.abs(daysBetween(serviceDate, date)) <= longestDaysFromServiceDate) continue;
    throw new Refusal({
      code: 'turn.date_far_from_times',
      message: 'the service date must be within a day of the times',
      facts: { serviceDate, at: formatInstant(at), zone },
    });
  }
  if (arrivalAt !== null && departureAt !== null && departureAt < arrivalAt) {
    throw new Refusal({ code: 'turn.order_of_times', message: 'the departure lies before the arrival' });
  }
}

function extraTurnOf(
  request: CreateTurnRequest,
  context: { zone: string; now: Instant; planId: string },
): TurnRecord {
  const { inbound, outbound } = request;
  const times = {
    scheduledArrivalAt: inbound === undefined ? null : Date.parse(inbound.scheduledArrivalAt),
    expectedArrivalAt: null,
    arrivalAt: null,
    scheduledDepartureAt: outbound === undefined ? null : Date.parse(outbound.scheduledDepartureAt),
    heldUntil: null,
    departureAt: null,
  };
  return {
    id: randomUUID(),
    version: 1,
    terminalCode: request.terminal,
    zone: context.zone,
    serviceDate: request.serviceDate,
    kind: kindOf(request),
    origin: 'extra',
    timetableId: null,
    pairKey: null,
    inboundTrain: inbound?.train ?? null,
    outboundTrain: outbound?.train ?? null,
    plannedTrack: request.track ?? null,
    plannedSet: request.set ?? null,
    reverses: null,
    planId: context.planId,
    track: request.track ?? null,
    set: request.set ?? null,
    annulledAt: null,
    entryCount: 0,
    correctionCount: 0,
    waitingCount: 0,
    crew: [],
    carriedCrew: [],
    ...times,
    ...spanOf(times),
    settledAt: null,
    withdrawnAt: null,
    createdAt: context.now,
  };
}

function kindOf({ inbound, outbound }: CreateTurnRequest): TurnKind {
  if (inbound === undefined) return 'first-out';
  return outbound === undefined ? 'tie-up' : 'turn';
}
