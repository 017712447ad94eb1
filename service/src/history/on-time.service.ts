import { Injectable } from '@nestjs/common';
import {
  delaySecondsOf,
  formatInstant,
  groupOnTime,
  measureOnTime,
  nameOfRule,
  verdictOf,
  type DepartureRow,
  type OnTimeAnswer,
  type OnTimeQuery,
  type OnTimeRule,
} from '@stubpost/shared';
import { Clock } from '../common/clock';
import { Refusal } from '../common/refusal';
import { TerminalsReadModel } from '../terminals/terminals.read-model';
import { DeparturesReadModel, type KnownDeparture } from './departures.read-model';

/** Longest range of one question, so that nobody can ask the service to stand still. */
const longestRangeDays = 400;

/** Answers how many left on time: loads, asks `shared`, adds nothing of its own. */
@Injectable()
export class OnTimeService {
  constructor(
    private readonly departures: DeparturesReadModel,
    private readonly terminals: TerminalsReadModel,
    private readonly clock: Clock,
  ) {}

  async answer(query: OnTimeQuery): Promise<OnTimeAnswer> {
    const terminal = await this.terminals.require(query.terminal);
    const departures = await this.load(query);
    const rule = ruleOf(query);
    return {
      rule: { name: nameOfRule(rule), ...rule, point: 'departure from the terminal' },
      ...measureOnTime(departures, rule),
      groups: groupOnTime(departures, rule, query.groupBy, terminal.zone),
    };
  }

  /** The departures behind the figures, each with its verdict. */
  async rows(query: OnTimeQuery): Promise<DepartureRow[]> {
    await this.terminals.require(query.terminal);
    const rule = ruleOf(query);
    return (await this.load(query)).map((departure) => toRow(departure, query.terminal, rule));
  }

  private load(query: OnTimeQuery): Promise<KnownDeparture[]> {
    const days = (Date.parse(query.to) - Date.parse(query.from)) / 86_400_000;
    if (days < 0) throw new Refusal({ code: 'history.range', message: 'the range ends before it begins' });
    if (days > longestRangeDays)
      throw new Refusal({
        code: 'history.range',
        message: `ask for at most ${longestRangeDays} days at once`,
      });
    return this.departures.departuresOf(query.terminal, query.from, query.to, this.clock.now());
  }
}

function ruleOf(query: OnTimeQuery): OnTimeRule {
  const { thresholdSeconds, inclusive, early, annulled } = query;
  return { thresholdSeconds, inclusive, early, annulled };
}

function toRow(departure: KnownDeparture, terminal: string, rule: OnTimeRule): DepartureRow {
  return {
    serviceDate: departure.serviceDate,
    terminal,
    train: departure.train,
    track: departure.track,
    set: departure.set,
    scheduledDepartureAt: formatInstant(departure.scheduledDepartureAt),
    actualDepartureAt:
      departure.actualDepartureAt === null ? null : formatInstant(departure.actualDepartureAt),
    annulled: departure.annulled,
    delaySeconds: delaySecondsOf(departure),
    onTime: verdictOf(departure, rule),
    origin: departure.origin,
    turnId: departure.turnId,
  };
}
