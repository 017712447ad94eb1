import { demoLines, demoTerminals, type DemoLine } from './geography';
import { groupBy } from './group-by';

/** One trip of the demo's day; minutes count from the start of the service day. */
export interface DemoTrip {
  line: DemoLine;
  train: string;
  fromStation: string;
  toStation: string;
  departsMinute: number;
  arrivesMinute: number;
  block: string;
  fromTrack: string;
  toTrack: string;
}

/** Weekdays run the rush hours; weekends do not. */
export type DayPattern = 'weekday' | 'weekend';

const quay = 'ostrel-quay';
const firstMinute = 5 * 60;
/** Trains run through the night, fewer of them: whoever looks in at three in the morning finds some. */
const midnightMinute = 24 * 60;
const lastMinute = 28 * 60 + 30;
/** Shortest scheduled layover when sets are assigned: the default plan's 520 s and about 2½ minutes of air. */
const shortestLayoverMinutes = 11;
/** The one layover of the demo that is too short on purpose, so that planners have something to find. */
const weakLayoverMinutes = 10;

const inRush = (minute: number): boolean =>
  (minute >= 360 && minute < 570) || (minute >= 930 && minute < 1140);

function departures(line: DemoLine, pattern: DayPattern, offsetMinutes: number): number[] {
  const minutes: number[] = [];
  let minute = firstMinute + offsetMinutes;
  while (minute <= lastMinute) {
    minutes.push(minute);
    const rush = pattern === 'weekday' && inRush(minute);
    const night = minute >= midnightMinute;
    minute += night ? line.nightHeadwayMinutes : rush ? line.rushHeadwayMinutes : line.headwayMinutes;
  }
  return minutes;
}

type Unassigned = Omit<DemoTrip, 'block' | 'fromTrack' | 'toTrack'>;

function tripsOf(line: DemoLine, pattern: DayPattern): Unassigned[] {
  const base = line.numbersFrom + (pattern === 'weekend' ? 2000 : 0);
  const run = (from: string, to: string, offset: number, parity: number): Unassigned[] =>
    departures(line, pattern, offset).map((minute, order) => ({
      line,
      train: String(base + 2 * order + parity),
      fromStation: from,
      toStation: to,
      departsMinute: minute,
      arrivesMinute: minute + line.runMinutes,
    }));
  return [
    ...run(quay, line.outer, line.firstTrains.fromQuay, 1),
    ...run(line.outer, quay, line.firstTrains.fromOuter, 0),
  ];
}

/** A set that would stand longer than this goes to the yard instead, and comes back as a first train out. */
const longestStandMinutes = 75;

/**
 * The set that came in last and has had time to turn goes out first; those left over go to the yard after a while. A
 * departure that finds no set standing takes one from the yard.
 */
function assignBlocks(
  trips: readonly Unassigned[],
  pattern: DayPattern,
): Array<Unassigned & { block: string }> {
  const standing = new Map<string, Array<{ block: string; sinceMinute: number }>>();
  const prefix = pattern === 'weekday' ? 'W' : 'E';
  let blocks = 0;
  const byDeparture = [...trips].sort(
    (a, b) => a.departsMinute - b.departsMinute || a.train.localeCompare(b.train),
  );
  return byDeparture.map((trip) => {
    const here = standing.get(trip.fromStation) ?? [];
    const position = here.findLastIndex(
      (set) =>
        set.sinceMinute + shortestLayoverMinutes <= trip.departsMinute &&
        set.sinceMinute + longestStandMinutes >= trip.departsMinute,
    );
    const taken = position < 0 ? undefined : here.splice(position, 1)[0];
    const block = taken?.block ?? `${prefix}${String((blocks += 1)).padStart(2, '0')}`;
    const there = standing.get(trip.toStation) ?? [];
    there.push({ block, sinceMinute: trip.arrivesMinute });
    there.sort((a, b) => a.sinceMinute - b.sinceMinute);
    standing.set(trip.toStation, there);
    return { ...trip, block };
  });
}

/** Moves the departure after the first arrival past 17:10 at the Quay forward, to leave ten minutes for the turn. */
function weaken<Trip extends Unassigned & { block: string }>(trips: Trip[]): Trip[] {
  const inbound = trips.find((trip) => trip.toStation === quay && trip.arrivesMinute >= 17 * 60 + 10);
  const outbound =
    inbound &&
    trips.find((trip) => trip.block === inbound.block && trip.departsMinute >= inbound.arrivesMinute);
  if (!inbound || !outbound) return trips;
  const departsMinute = inbound.arrivesMinute + weakLayoverMinutes;
  return trips.map((trip) =>
    trip === outbound
      ? { ...trip, departsMinute, arrivesMinute: departsMinute + trip.line.runMinutes }
      : trip,
  );
}

/** Gives each stay at a terminal a track that is free two minutes before and after it. */
function assignTracks(trips: ReadonlyArray<Unassigned & { block: string }>): DemoTrip[] {
  const byBlock = groupBy(trips, (trip) => trip.block);
  const stays = [...byBlock.values()].flatMap((chain) => {
    const ordered = [...chain].sort((a, b) => a.departsMinute - b.departsMinute);
    return [undefined, ...ordered].map((inbound, index) => ({ inbound, outbound: ordered[index] }));
  });
  const from = new Map<string, string>();
  const to = new Map<string, string>();
  const freeAt = new Map<string, number>();
  const startOf = (stay: (typeof stays)[number]) =>
    stay.inbound?.arrivesMinute ?? (stay.outbound?.departsMinute ?? 0) - 15;
  const endOf = (stay: (typeof stays)[number]) => stay.outbound?.departsMinute ?? startOf(stay) + 15;
  for (const stay of stays.sort((a, b) => startOf(a) - startOf(b))) {
    const station = stay.inbound?.toStation ?? stay.outbound?.fromStation ?? quay;
    const tracks = demoTerminals.find((terminal) => terminal.stationId === station)?.tracks ?? [];
    const soonest = [...tracks].sort(
      (a, b) => (freeAt.get(`${station}|${a.label}`) ?? 0) - (freeAt.get(`${station}|${b.label}`) ?? 0),
    )[0];
    const label = soonest?.label ?? '1';
    freeAt.set(`${station}|${label}`, endOf(stay) + 2);
    if (stay.inbound) to.set(stay.inbound.train, label);
    if (stay.outbound) from.set(stay.outbound.train, label);
  }
  return trips.map((trip) => ({
    ...trip,
    fromTrack: from.get(trip.train) ?? '1',
    toTrack: to.get(trip.train) ?? '1',
  }));
}

/** Every trip of one day pattern with its block and its tracks, in order of departure. */
export function tripsOfDay(pattern: DayPattern): DemoTrip[] {
  const trips = demoLines.flatMap((line) => tripsOf(line, pattern));
  return assignTracks(weaken(assignBlocks(trips, pattern)));
}
