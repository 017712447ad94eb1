import { Injectable } from '@nestjs/common';
import { type Instant, type RecordEntryRequest } from '@stubpost/shared';
import { AlertKeeper } from '../alerts/alert-keeper';
import { Refusal } from '../common/refusal';
import type { Transaction } from '../database/unit-of-work';
import { PeopleReadModel } from '../people/people.read-model';
import { PlansService } from '../plans/plans.service';
import { EntryLog, type LoggedEntry, type Seal } from '../records/entry-log';
import { SetsService } from '../sets/sets.service';
import { CrewCarrier, crewOf, sameCrew } from './crew-carrier';
import { type EntryBody, entryBodyFrom, peopleNamedIn, saysTheSame } from './entry-body';
import { entryFrom } from './entry-from-body';
import { type Actor, RecordingRights } from './recording-rights';
import { TurnChanges } from './turn-changes';
import { type TurnFile, turnFileFrom } from './turn-file';
import { TurnFiles } from './turn-files';
import type { TurnRecord } from './turn-record';
import { spanOf } from './turn-span';
import { isOver, watchedTurnOf } from './watched-turn';
import { TurnRepository } from './turn.repository';

/** One entry to be recorded, by whom, and when it came in. */
export interface RecordCommand {
  turnId: string;
  request: RecordEntryRequest;
  actor: Actor;
  now: Instant;
}

/** The receipt of an entry, and the turn as it stands with it. */
export interface Recorded extends Seal {
  /** False when the entry was there already. */
  isNew: boolean;
  file: TurnFile;
}

/**
 * Records entries inside an open transaction: seals and appends the entry, brings the row of the turn after it, and
 * looks at its alerts at once. What has happened is never refused; only a writer without the right, an id that
 * another entry has, and words that nobody knows are.
 */
@Injectable()
export class EntryRecorder {
  constructor(
    private readonly turns: TurnRepository,
    private readonly files: TurnFiles,
    private readonly log: EntryLog,
    private readonly rights: RecordingRights,
    private readonly people: PeopleReadModel,
    private readonly plans: PlansService,
    private readonly sets: SetsService,
    private readonly crews: CrewCarrier,
    private readonly alerts: AlertKeeper,
    private readonly changes: TurnChanges,
  ) {}

  async record(transaction: Transaction, command: RecordCommand): Promise<Recorded> {
    const { turnId, request, actor, now } = command;
    const record = await this.turns.findById(transaction, turnId);
    if (record === null) throw unknownTurn();
    this.rights.requireKind(actor, request.kind, record.terminalCode);
    const file = await this.files.open(transaction, record);
    const known = await this.log.findById(transaction, request.id);
    const receivedAt = known?.receivedAt ?? now;
    const body = await this.bodyOf(command, record, receivedAt);
    if (known !== null) return this.again(known, body, file);
    const entry = entryFrom({ id: request.id, receivedAt, body });
    await this.rights.require(transaction, { actor, request, entry, file, now });
    await this.requireKnownStep(request, file);
    const logged = { id: request.id, receivedAt: now, body };
    const seal = await this.log.append(transaction, logged);
    const after = await this.follow(transaction, file, logged);
    return { isNew: true, ...seal, file: after };
  }

  private async bodyOf(
    { request, actor }: RecordCommand,
    turn: TurnRecord,
    receivedAt: Instant,
  ): Promise<EntryBody> {
    const names = new Map<string, string>();
    for (const id of peopleNamedIn(request)) {
      const name = id === actor.id ? actor.name : await this.people.nameOf(id);
      if (name === null) {
        throw new Refusal({
          code: 'entry.person_unknown',
          message: 'there is no such person',
          facts: { person: id },
        });
      }
      names.set(id, name);
    }
    const by = { id: actor.id, name: actor.name };
    return entryBodyFrom({ request, turn, by, receivedAt, nameOf: (id) => names.get(id) ?? '' });
  }

  /** The same id twice is one entry and one receipt; with another body it is somebody's mistake. */
  private again(known: LoggedEntry, body: EntryBody, file: TurnFile): Recorded {
    if (!saysTheSame(known.body as EntryBody, body)) {
      throw new Refusal({
        code: 'entry.id_taken',
        message: 'another entry has that id',
        facts: { id: known.id },
      });
    }
    return { isNew: false, sequence: known.sequence, hash: known.hash, file };
  }

  /** A key that no version of the terminal's plans has cannot be read; one of another version is kept. */
  private async requireKnownStep(request: RecordEntryRequest, file: TurnFile): Promise<void> {
    if (!('step' in request)) return;
    const { step } = request;
    if (file.plan.steps.some((known) => known.key === step)) return;
    if (await this.plans.isStepAnywhere(file.record.terminalCode, step)) return;
    throw new Refusal({ code: 'entry.step_unknown', message: `no step is called ${step}`, facts: { step } });
  }

  private async follow(
    transaction: Transaction,
    before: TurnFile,
    logged: { id: string; receivedAt: Instant; body: EntryBody },
  ): Promise<TurnFile> {
    const entries = [...before.entries, entryFrom(logged)];
    const changed = turnFileFrom({ ...before, entries });
    const onItsSet = await this.onItsSet(transaction, before, changed);
    const now = logged.receivedAt;
    const { alerts, isQuiet } = await this.alerts.observe(transaction, watchedTurnOf(onItsSet), now);
    const settledAt = isQuiet && isOver(onItsSet.facts, now) ? now : null;
    const record = await this.turns.follow(transaction, { ...copiesOf(onItsSet), settledAt });
    const after = { ...onItsSet, record, alerts };
    this.files.stage(transaction, after);
    this.changes.note(transaction, record);
    await this.carryCrews(transaction, before, after);
    return after;
  }

  /** A turn whose set was changed takes over the cars of the new set and the crew that set brings along. */
  private async onItsSet(transaction: Transaction, before: TurnFile, changed: TurnFile): Promise<TurnFile> {
    const { set } = changed.facts;
    if (set === before.facts.set) return changed;
    const cars = set === null ? [] : await this.sets.carsOf(transaction, set);
    const carriedCrew = await this.crews.carriedInto(transaction, { ...changed.record, set });
    return turnFileFrom({ ...changed, cars, record: { ...changed.record, carriedCrew } });
  }

  private async carryCrews(transaction: Transaction, before: TurnFile, after: TurnFile): Promise<void> {
    const sets = new Set([before.facts.set, after.facts.set].filter((set) => set !== null));
    const isSame =
      sets.size < 2 &&
      sameCrew(before.facts.crew, after.facts.crew) &&
      (before.facts.annulled === null) === (after.facts.annulled === null);
    if (isSame) return;
    for (const set of sets) {
      const later = await this.crews.carryOn(transaction, set, after.record);
      for (const record of later) this.changes.note(transaction, record);
    }
  }
}

/** The row of a turn with copies of what its entries say now. */
function copiesOf({ record, facts, entries }: TurnFile): TurnRecord {
  const times = {
    scheduledArrivalAt: record.scheduledArrivalAt,
    scheduledDepartureAt: record.scheduledDepartureAt,
    expectedArrivalAt: facts.expectedArrivalAt,
    arrivalAt: facts.arrivalAt,
    heldUntil: facts.heldUntil,
    departureAt: facts.departureAt,
  };
  return {
    ...record,
    ...times,
    ...spanOf(times),
    track: facts.track,
    set: facts.set,
    annulledAt: facts.annulled?.at ?? null,
    entryCount: entries.length,
    correctionCount: facts.corrections.length,
    waitingCount: facts.corrections.filter((each) => each.state === 'waiting').length,
    crew: crewOf(facts.crew),
    withdrawnAt: null,
  };
}

/** The refusal for an id that no turn has. */
export function unknownTurn(): Refusal {
  return new Refusal({ code: 'turn.unknown', message: 'there is no such turn' });
}
