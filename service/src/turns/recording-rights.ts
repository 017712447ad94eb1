import { Injectable } from '@nestjs/common';
import {
  type ControlsQuestion,
  type Entry,
  type Instant,
  type PersonAccess,
  type RecordEntryRequest,
  addSeconds,
  barredAtTheControls,
  mayRecord,
  withdrawalReach,
  wouldNeedApproval,
} from '@stubpost/shared';
import { Refusal } from '../common/refusal';
import type { Transaction } from '../database/unit-of-work';
import type { TurnFile } from './turn-file';
import { TurnRepository } from './turn.repository';

/** Who records: a person with the name of the day. */
export interface Actor extends PersonAccess {
  name: string;
}

/** One entry about to be recorded. */
export interface RecordingQuestion {
  actor: Actor;
  request: RecordEntryRequest;
  /** The request as an entry. */
  entry: Entry;
  file: TurnFile;
  now: Instant;
}

/** An engineer whose train was not heard of any more is off its controls after this long: the longest day on duty. */
const longestAtControlsSeconds = 12 * 3600;
const engineerInCab = 'engineer-in-cab';

/** Whether somebody may record an entry. Says no with 403 and nothing else: what has happened is never refused. */
@Injectable()
export class RecordingRights {
  constructor(private readonly turns: TurnRepository) {}

  /** The role must be one that records this kind of entry at the terminal. */
  requireKind(actor: Actor, kind: RecordEntryRequest['kind'], terminalCode: string): void {
    if (mayRecord(actor, kind, terminalCode)) return;
    throw new Refusal({
      code: 'entry.kind_not_permitted',
      message: `not allowed to record ${kind} at ${terminalCode}`,
      facts: { kind, terminal: terminalCode },
    });
  }

  /** Everything that depends on the turn itself. */
  async require(transaction: Transaction, question: RecordingQuestion): Promise<void> {
    this.requireReach(question);
    this.requireAnotherPerson(question);
    await this.requireOffTheControls(transaction, question);
  }

  /**
   * A crew takes back and corrects its own entries, the desk anybody's. Once the train has left, anybody of the crew
   * may ask for a correction of any entry: it waits for a supervisor.
   */
  private requireReach({ actor, entry, file }: RecordingQuestion): void {
    if (entry.kind !== 'withdrawn' && entry.kind !== 'corrected') return;
    if (withdrawalReach(actor, file.record.terminalCode) === 'anyone') return;
    const target = file.entries.find((each) => each.id === entry.target);
    if (target === undefined || target.by?.personId === actor.id) return;
    if (wouldNeedApproval(file.entries, entry)) return;
    throw new Refusal({ code: 'entry.not_yours', message: 'that entry was made by somebody else' });
  }

  /** Nobody decides on what they asked for themselves. */
  private requireAnotherPerson({ actor, entry, file }: RecordingQuestion): void {
    if (entry.kind !== 'correction-approved' && entry.kind !== 'correction-declined') return;
    const request = file.entries.find((each) => each.id === entry.target);
    if (request?.by?.personId !== actor.id) return;
    throw new Refusal({
      code: 'entry.own_request',
      message: 'you asked for this correction yourself: somebody else must decide on it',
    });
  }

  private async requireOffTheControls(transaction: Transaction, question: RecordingQuestion): Promise<void> {
    const { actor, request, entry, file, now } = question;
    const isEngineerOfTurn = file.facts.crew.some(
      (member) => member.as === 'engineer' && member.personId === actor.id,
    );
    if (!isEngineerOfTurn) return;
    const bars = barredAtTheControls({
      isEngineerOfTurn,
      step: 'step' in request ? request.step : undefined,
      source: request.source,
      observedAt: entry.observedAt,
      receivedAt: now,
      atControls: await this.timeAtControls(transaction, file, actor),
    });
    if (!bars) return;
    throw new Refusal({
      code: 'entry.at_the_controls',
      message:
        'the engineer at the controls records nothing: the conductor does, or the desk by radio, or it is entered later',
    });
  }

  private async timeAtControls(
    transaction: Transaction,
    file: TurnFile,
    actor: Actor,
  ): Promise<ControlsQuestion['atControls']> {
    const from = file.facts.doneAt[engineerInCab];
    if (from === undefined) return null;
    const arrivedAt = await this.turns.findNextArrival(transaction, {
      turnId: file.record.id,
      set: file.facts.set,
      personId: actor.id,
      after: from,
    });
    return { from, until: arrivedAt ?? addSeconds(from, longestAtControlsSeconds) };
  }
}
