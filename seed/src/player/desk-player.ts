import type { INestApplicationContext } from '@nestjs/common';
import { AlertDesk, Clock, Reader, TurnFiles, TurnsService } from '@stubpost/service';
import {
  formatInstant,
  secondsBetween,
  type AlertCause,
  type CalendarDate,
  type Instant,
  type RecordCorrection,
  type RecordEntryRequest,
} from '@stubpost/shared';
import { randomOf } from '../railroad/random';
import type { Cast, CastMember } from './cast';
import { entryIdOf } from './entry-id';

interface AlertRow {
  id: string;
  cause: AlertCause;
  state: string;
  terminal: string;
  raised_at: number;
  cleared_at: number | null;
}

/** How the desk behaves: it takes about half of what is raised, and names causes after a while. Our choice. */
const takenShare = 0.5;
const takesAfterSeconds = 75;
const namesCauseAfterSeconds = 900;

const causes: Partial<Record<AlertCause, readonly string[]>> = {
  'late-departure': [
    'late inbound train',
    'crowded platform',
    'air charged slowly',
    'crew walked the length of the train',
    'waited for a connection',
  ],
  'running-test': ['said by radio at the next stop', 'entered by the conductor later'],
  'no-word': ['phone had no signal', 'radio channel was busy'],
};
const otherCauses = ['settled by radio with the crew'];

function causeOf(alert: AlertRow): string {
  const named = causes[alert.cause] ?? otherCauses;
  return (
    named[Math.floor(randomOf(`cause|${alert.id}`).next() * named.length)] ?? 'settled by radio with the crew'
  );
}

/** One in six corrections is declined. Our choice. */
const declinedShare = 1 / 6;

function decisionOn({ entryId: target }: RecordCorrection, now: Instant): RecordEntryRequest {
  const base = {
    id: entryIdOf(`${target} decision`),
    observedAt: formatInstant(now),
    source: 'by-hand',
    target,
  } as const;
  const declined = randomOf(`decision|${target}`).next() < declinedShare;
  return declined
    ? { ...base, kind: 'correction-declined', reason: 'the time of the event recorder stands' }
    : { ...base, kind: 'correction-approved' };
}

/** The demo's desk: takes alerts, and names the causes of those that are over. Half of them it leaves to visitors. */
export class DeskPlayer {
  constructor(
    private readonly app: INestApplicationContext,
    private readonly cast: Cast,
  ) {}

  /** Looks at what stands and what has cleared. */
  async tick(): Promise<void> {
    const now = this.app.get(Clock).now();
    const alerts = await this.app.get(Reader).query<AlertRow>(
      `SELECT id, cause, state, terminal_code AS terminal, raised_at, cleared_at FROM alert
       WHERE state IN ('raised', 'cleared')`,
    );
    for (const alert of alerts) {
      if (alert.state === 'cleared') await this.close(alert, now);
      else await this.take(alert, now);
    }
  }

  /** Names the causes of a past day's alerts, as the supervisor did the morning after. */
  async settle(serviceDate: CalendarDate, now: Instant): Promise<void> {
    const alerts = await this.app.get(Reader).query<AlertRow>(
      `SELECT a.id, a.cause, a.state, a.terminal_code AS terminal, a.raised_at, a.cleared_at
       FROM alert a JOIN turn t ON t.id = a.turn_id WHERE t.service_date = ? AND a.state = 'cleared'`,
      [serviceDate],
    );
    for (const alert of alerts)
      await this.app.get(AlertDesk).close(this.actOn(alert, now), { cause: causeOf(alert) });
    await this.decideCorrections(serviceDate, now);
  }

  /** Decides on the corrections of a past day; those of today are left to visitors. */
  private async decideCorrections(serviceDate: CalendarDate, now: Instant): Promise<void> {
    const supervisor = this.cast.withRole('supervisor')[0];
    if (supervisor === undefined) throw new Error('the demo has no supervisor');
    const turns = await this.app
      .get(Reader)
      .query<{ id: string }>('SELECT id FROM turn WHERE service_date = ? AND waiting_count > 0', [
        serviceDate,
      ]);
    for (const { id: turnId } of turns) {
      const file = await this.app.get(TurnFiles).find(turnId);
      const waiting = (file?.facts.corrections ?? []).filter((each) => each.state === 'waiting');
      await this.app
        .get(TurnsService)
        .recordPastEntries(
          waiting.map((each) => ({ turnId, request: decisionOn(each, now), actor: supervisor, now })),
        );
    }
  }

  private async take(alert: AlertRow, now: Instant): Promise<void> {
    if (randomOf(`take|${alert.id}`).next() >= takenShare) return;
    if (secondsBetween(Number(alert.raised_at), now) < takesAfterSeconds) return;
    await this.app.get(AlertDesk).take(this.actOn(alert, now));
  }

  private async close(alert: AlertRow, now: Instant): Promise<void> {
    if (alert.cleared_at === null || secondsBetween(Number(alert.cleared_at), now) < namesCauseAfterSeconds)
      return;
    await this.app.get(AlertDesk).close(this.actOn(alert, now), { cause: causeOf(alert) });
  }

  private actOn(alert: AlertRow, now: Instant) {
    return { alertId: alert.id, person: this.deskOf(alert.terminal), now };
  }

  /** The dispatcher of the terminal itself where it has one, else the one for all. */
  private deskOf(terminal: string): CastMember {
    const desks = this.cast.withRole('dispatcher');
    const own = desks.find((desk) => desk.roles.some((grant) => grant.terminal === terminal));
    const desk = own ?? desks[0];
    if (desk === undefined) throw new Error('the demo has no dispatcher');
    return desk;
  }
}
