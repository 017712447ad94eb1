import { orNull, problemsOf, type DraftStop, type RowReader, type TimetableDraft } from './draft';

/** Platforms, stations and all that stands between them. */
export function stopReader(draft: TimetableDraft): RowReader {
  const { leaveOut } = problemsOf(draft, 'stops.txt');
  return (field, line) => {
    const stopId = field('stop_id');
    if (stopId === '') return leaveOut(line, 'stop.no_id', 'A stop without an id is left out.');
    if (draft.stops.has(stopId)) {
      return leaveOut(line, 'stop.twice', `Stop “${stopId}” stands above already. This row is left out.`);
    }
    draft.stops.set(stopId, {
      stopId,
      name: field('stop_name') || stopId,
      code: orNull(field('stop_code')),
      platform: orNull(field('platform_code')),
      parentId: orNull(field('parent_station')),
      locationType: field('location_type') || '0',
      line,
      calledAt: 'never',
    });
  };
}

/**
 * Takes away what leads nowhere in the parent chains: a parent that is not in the file, and a chain that bites its own
 * tail. The stop then stands alone.
 */
export function mendParents(draft: TimetableDraft): void {
  const { leaveOut } = problemsOf(draft, 'stops.txt');
  for (const stop of draft.stops.values()) {
    if (stop.parentId !== null && !draft.stops.has(stop.parentId)) {
      const message = `Parent “${stop.parentId}” is not in the file. Stop “${stop.stopId}” stands alone.`;
      leaveOut(stop.line, 'stop.parent_unknown', message);
      stop.parentId = null;
    }
  }
  for (const stop of draft.stops.values()) {
    if (!isOwnAncestor(draft.stops, stop)) continue;
    leaveOut(stop.line, 'stop.parent_circle', `Stop “${stop.stopId}” is its own parent. It stands alone.`);
    stop.parentId = null;
  }
}

function isOwnAncestor(stops: Map<string, DraftStop>, stop: DraftStop): boolean {
  const seen = new Set<string>();
  let at = stop.parentId;
  while (at !== null && !seen.has(at)) {
    if (at === stop.stopId) return true;
    seen.add(at);
    at = stops.get(at)?.parentId ?? null;
  }
  return false;
}

/** The top of the parent chain of a stop. Needs mended parents. */
export function stationOf(stops: ReadonlyMap<string, DraftStop>, stopId: string): string {
  const parent = stops.get(stopId)?.parentId ?? null;
  return parent === null ? stopId : stationOf(stops, parent);
}
