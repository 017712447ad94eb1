import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import {
  type CreateTurnRequest,
  type Instant,
  type TurnKind,
  type WireEntry,
  calendarDateAt,
  daysBetween,
  formatInstant,
} from '@stubpost/shared';
import { Access } from '../common/access';
import { Refusal } from '../common/refusal';
import type { CurrentPersonFacts } from '../common/signed-in';
import { type Transaction, UnitOfWork } from '../database/unit-of-work';
import { PlansService } from '../plans/plans.service';
import { EntryLog } from '../records/entry-log';
import { SetsService } from '../sets/sets.service';
import { TerminalsReadModel } from '../terminals/terminals.read-model';
import { TerminalsService } from '../terminals/terminals.service';
import { CrewCarrier } from './crew-carrier';
import { EntryRecorder, type RecordCommand, type Recorded, unknownTurn } from './entry-recorder';
import { TurnChanges } from './turn-changes';
import { type TurnFile, turnFileFrom } from './turn-file';
import { TurnFiles } from './turn-files';
import type { TurnRecord } from './turn-record';
import { spanOf } from './turn-span';
import { TurnRepository } from './turn.repository';

/** A turn's trains may run on the day before or after its service date, not further away. */
const longestDaysFromServiceDate = 1;

/** Turns: entering extra ones, recording what happens, and reading single ones. */
@Injectable()
export class TurnsService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly turns: TurnRepository,
    private readonly files: TurnFiles,
    private readonly recorder: EntryRecorder,
    private readonly changes: TurnChanges,
    private readonly log: EntryLog,
    private readonly plans: PlansService,
    private readonly sets: SetsService,
    private readonly crews: CrewCarrier,
    private readonly terminals: TerminalsReadModel,
    private readonly terminalRows: TerminalsService,
    private readonly access: Access,
  ) {}

  /** A turn that somebody may look at. */
  async require(id: string, person: CurrentPersonFacts): Promise<TurnFile> {
    const file = await this.files.find(id);
    if (file === null) throw unknownTurn();
    this.access.require(person, 'board.read', file.record.terminalCode);
    return file;
  }

  /** The log of a turn in sequence order. */
  async entriesOf(id: string, person: CurrentPersonFacts): Promise<WireEntry[]> {
    const { record } = await this.require(id, person);
    this.access.require(person, 'entries.read', record.terminalCode);
    const logged = (await this.log.findAbout([id])).get(id) ?? [];
    return logged.map(
      ({ sequence, hash, id: entryId, receivedAt, body }) =>
        ({ sequence, hash, id: entryId, receivedAt: formatInstant(receivedAt), ...body }) as WireEntry,
    );
  }

  /** Records one entry in a transaction of its own. */
  async recordEntry(command: RecordCommand): Promise<Recorded> {
    const [recorded] = await this.recordEntries([command]);
    if (recorded === undefined) throw new Error('a command gave no receipt');
    return recorded;
  }

  /** Records entries one after the other in one transaction: all are kept, or none. */
  recordEntries(commands: readonly RecordCommand[]): Promise<Recorded[]> {
    return this.unitOfWork.run(async (transaction) => {
      const recorded = await this.recordAll(transaction, commands);
      await this.changes.write(transaction);
      return recorded;
    });
  }

  /** The same for days gone by, when a whole history is told: nobody who watches the present hears of each turn. */
  recordPastEntries(commands: readonly RecordCommand[]): Promise<Recorded[]> {
    return this.unitOfWork.run((transaction) => this.recordAll(transaction, commands));
  }

  private async recordAll(transaction: Transaction, commands: readonly RecordCommand[]): Promise<Recorded[]> {
    const recorded: Recorded[] = [];
    for (const command of commands) recorded.push(await this.recorder.record(transaction, command));
    return recorded;
  }

  /** Enters an extra turn. An unknown track is added to the terminal; two turns on one track are a clash to show. */
  async createExtra(request: CreateTurnRequest, now: Instant): Promise<TurnFile> {
    const terminal = await this.terminals.require(request.terminal);
    checkTimes(request, terminal.zone);
    return this.unitOfWork.run((transaction) =>
      this.createExtraIn(transaction, request, { zone: terminal.zone, now }),
    );
  }

  private async createExtraIn(
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
