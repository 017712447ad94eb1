import { Injectable } from '@nestjs/common';
import { type Instant, addSeconds, crewToCarry } from '@stubpost/shared';
import type { Transaction } from '../database/unit-of-work';
import type { CrewMemberOfTurn } from './turn.entity';
import { turnFactsFrom, turnFileFrom } from './turn-file';
import { TurnFiles } from './turn-files';
import type { TurnRecord } from './turn-record';
import { TurnRepository } from './turn.repository';

/** A crew stays with its set over a gap of this length; after a longer one somebody has to say so. Our choice. */
const longestGapSeconds = 4 * 3600;
/** Turns of a set that can follow one another without any word about their crew. A guard, never reached in a day. */
const longestChain = 40;

/**
 * Carries the crew of a set over to its next turn, and on to the ones after it, until an entry says otherwise. Always
 * worked out anew from the turn before, so the order in which entries come in does not matter.
 */
@Injectable()
export class CrewCarrier {
  constructor(
    private readonly turns: TurnRepository,
    private readonly files: TurnFiles,
  ) {}

  /** The crew that a turn begins with: that of its set's turn before. */
  async carriedInto(
    transaction: Transaction,
    turn: Pick<TurnRecord, 'id' | 'set' | 'spanFrom'>,
  ): Promise<CrewMemberOfTurn[]> {
    if (turn.set === null) return [];
    const limit = addSeconds(turn.spanFrom, -2 * longestGapSeconds);
    const before = await this.turns.findOfSet(transaction, turn.set, {
      side: 'before',
      of: turn.spanFrom,
      limit,
      except: turn.id,
    });
    if (before === null || turn.spanFrom > addSeconds(before.spanTo, longestGapSeconds)) return [];
    return crewOf(crewToCarry((await this.files.open(transaction, before)).facts));
  }

  /** Brings the later turns of a set after a change of the crew before them; gives those that changed. */
  async carryOn(
    transaction: Transaction,
    set: string,
    from: { id: string; spanFrom: Instant },
  ): Promise<TurnRecord[]> {
    const changed: TurnRecord[] = [];
    let previous: { id: string; spanFrom: Instant } = from;
    for (let count = 0; count < longestChain; count += 1) {
      const next = await this.turns.findOfSet(transaction, set, {
        side: 'after',
        of: previous.spanFrom,
        limit: addSeconds(previous.spanFrom, 2 * longestGapSeconds),
        except: previous.id,
      });
      if (next === null) return changed;
      const carriedCrew = await this.carriedInto(transaction, next);
      if (sameCrew(carriedCrew, next.carriedCrew)) return changed;
      changed.push(await this.bring(transaction, next, carriedCrew));
      previous = next;
    }
    return changed;
  }

  private async bring(
    transaction: Transaction,
    turn: TurnRecord,
    carriedCrew: CrewMemberOfTurn[],
  ): Promise<TurnRecord> {
    const file = await this.files.open(transaction, turn);
    const carried = { ...turn, carriedCrew };
    const crew = crewOf(turnFactsFrom({ ...file, record: carried }).crew);
    const record = await this.turns.follow(transaction, { ...carried, crew });
    this.files.stage(transaction, turnFileFrom({ ...file, record }));
    return record;
  }
}

/** The members of a crew as the row keeps them. */
export function crewOf(crew: readonly CrewMemberOfTurn[]): CrewMemberOfTurn[] {
  return crew.map(({ as, personId, name }) => ({ as, personId, name }));
}

/** Whether two crews are the same people in the same jobs. */
export function sameCrew(a: readonly CrewMemberOfTurn[], b: readonly CrewMemberOfTurn[]): boolean {
  return JSON.stringify(crewOf(a)) === JSON.stringify(crewOf(b));
}
