import type { INestApplicationContext } from '@nestjs/common';
import { Clock, DutyRosters, DutyRostersService } from '@stubpost/service';
import { addDays, calendarDateAt, formatInstant, serviceInstant, type WireDutyShift } from '@stubpost/shared';
import { demoTerminals, demoZone } from '../railroad/geography';
import type { Cast } from './cast';

/** So many days are put on the roster at a time. */
const daysAhead = 14;
const hour = 3600;

/** Early, late and night at the desk, in seconds of the service day. */
const watches = [
  [5 * hour, 13 * hour],
  [13 * hour, 21 * hour],
  [21 * hour, 29 * hour],
] as const;

/** Puts people on the duty roster of each terminal for the next two weeks, once those before have run out. */
export async function keepRoster(app: INestApplicationContext, cast: Cast): Promise<void> {
  const now = app.get(Clock).now();
  const supervisor = cast.withRole('supervisor')[0];
  if (supervisor === undefined) throw new Error('the demo has no supervisor');
  for (const { code } of demoTerminals) {
    const roster = await app.get(DutyRosters).find(code);
    if (roster === null || roster.shifts.some(({ until }) => until > now)) continue;
    const shifts = shiftsAt(code, cast, calendarDateAt(now, demoZone));
    const steps = roster.steps.map((step) => ({ ...step, channels: [...step.channels] }));
    const quietHours = [{ personId: supervisor.id, from: '22:00', until: '05:00' }];
    const request = { version: roster.version, shifts, steps, quietHours };
    await app.get(DutyRostersService).change(code, request, supervisor.name);
  }
}

/** The terminal's own dispatcher where there is one works early and late; the railroad's is deputy, and alone at night. */
function shiftsAt(code: string, cast: Cast, today: string): WireDutyShift[] {
  const dispatchers = cast.withRole('dispatcher');
  const chief = dispatchers.find(({ roles }) => roles.some(({ terminal }) => terminal === '*'));
  const local = dispatchers.find(({ roles }) => roles.some(({ terminal }) => terminal === code));
  if (chief === undefined) throw new Error('the demo has no dispatcher for every terminal');
  return Array.from({ length: daysAhead + 1 }, (_, index) => addDays(today, index - 1)).flatMap((date) =>
    watches.flatMap(([from, until], watch): WireDutyShift[] => {
      const times = {
        from: formatInstant(serviceInstant(date, from, demoZone)),
        until: formatInstant(serviceInstant(date, until, demoZone)),
      };
      const onDesk = watch < 2 ? (local ?? chief) : chief;
      const desk = { personId: onDesk.id, as: 'desk', ...times } as const;
      return onDesk === chief ? [desk] : [desk, { personId: chief.id, as: 'deputy', ...times }];
    }),
  );
}
