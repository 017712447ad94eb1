import { Injectable } from '@nestjs/common';
import {
  type ControlsQuestion,
  type Instant,
  type PersonAccess,
  type RecordEntryRequest,
  addSeconds,
  barredAtTheControls,
  mayRecord,
  withdrawalReach,
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
    await this.requireOffTheControls(transaction, question);
  }

  /** A crew takes back and corrects its own entries, and only before the departure; the desk anybody's. */
  private requireReach({ actor, request, file }: RecordingQuestion): void {
    if (request.kind !== 'withdrawn' && request.kind !== 'corrected') return;
    if (withdrawalReach(actor, file.record.terminalCode) === 'anyone') return;
    const target = file.entries.find((entry) => entry.id === request.target);
    if (target !== undefined && target.by?.personId !== actor.id) {
      throw new Refusal({ code: 'entry.not_yours', message: 'that entry was made by somebody else' });
    }
    const { departureAt } = file.facts;
    if (departureAt === null || Date.parse(request.observedAt) < departureAt) return;
    throw new Refusal({
      code: 'entry.after_departure',
      message: 'the train has left: a supervisor corrects the record',
      facts: { departureAt: new Date(departureAt).toISOString() },
    });
  }

  private async requireOffTheControls(transaction: Transaction, question: RecordingQuestion): Promise<void> {
    const { actor, request, file, now } = question;
    const isEngineerOfTurn = file.facts.crew.some(
      (member) => member.as === 'engineer' && member.personId === actor.id,
    );
    if (!isEngineerOfTurn) return;
    const bars = barredAtTheControls({
      isEngineerOfTurn,
      step: 'step' in request ? request.step : undefined,
      source: request.source,
      observedAt: Date.parse(request.observedAt),
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
