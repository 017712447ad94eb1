import type { Timetable, TimetableStop } from './timetable';

/** Longest label of a track; longer platform codes are cut. */
const longestLabel = 12;

/** Tracks that a timetable suggests for a terminal. */
export interface TerminalTracks {
  /** Labels in the order of the board, numbers by value. */
  labels: string[];
  /** Label by stop id, for every stop that is a platform of the terminal. */
  byStop: ReadonlyMap<string, string>;
}

/** Compares labels the way people number tracks: 2 before 10, 3A after 3. */
const inTrackOrder = new Intl.Collator('en', { numeric: true }).compare;

/**
 * Which stops are platforms: those with a platform code, and stops under a station. Where others have platform codes,
 * a stop without one counts only if trains call at it; bays that only other modes use never do.
 */
function platformsOf(stops: readonly TimetableStop[]): TimetableStop[] {
  const anyCoded = stops.some((stop) => stop.platform !== null);
  return stops.filter((stop) => {
    if (stop.calledAt === 'by-others') return false;
    if (stop.platform !== null) return true;
    if (stop.stopId === stop.stationId) return false;
    return stop.calledAt === 'by-train' || !anyCoded;
  });
}

/**
 * The tracks of a terminal that is made of stations of a timetable: the platforms by their platform code, else by
 * their stop code, else by a running number in the order of their ids. A station without platforms suggests none.
 */
export function terminalTracks(timetable: Timetable, stationIds: readonly string[]): TerminalTracks {
  const stations = new Set(stationIds);
  const platforms = platformsOf(timetable.stops.filter((stop) => stations.has(stop.stationId)));
  const byStop = new Map<string, string>();
  for (const { stopId, platform, code } of platforms) {
    const label = platform ?? code;
    if (label !== null) byStop.set(stopId, label.slice(0, longestLabel));
  }
  const taken = new Set(byStop.values());
  const unnamed = platforms.map((stop) => stop.stopId).filter((stopId) => !byStop.has(stopId));
  let number = 1;
  for (const stopId of unnamed.sort(inTrackOrder)) {
    while (taken.has(String(number))) number += 1;
    byStop.set(stopId, String(number));
    taken.add(String(number));
  }
  return { labels: [...taken].sort(inTrackOrder), byStop };
}
