/** Which kinds of route a timetable is read for: GTFS route types, as a list of inclusive ranges. */
export type RouteTypes = readonly (readonly [from: number, to: number])[];

/** Rail: basic type 2 and the extended types of railway service, 100 to 117. */
export const railRouteTypes: RouteTypes = [
  [2, 2],
  [100, 117],
];

/**
 * Reads a comma-separated list of route types, single (`2`) or as a range (`100-117`), blanks allowed.
 * Null when a part is neither, or nothing is named.
 */
export function parseRouteTypes(text: string): RouteTypes | null {
  const ranges = text.split(',').map((part) => {
    const match = /^(\d{1,4})(?:-(\d{1,4}))?$/.exec(part.trim());
    if (match === null) return null;
    const from = Number(match[1]);
    const to = Number(match[2] ?? match[1]);
    return from <= to ? ([from, to] as const) : null;
  });
  return ranges.every((range) => range !== null) ? ranges : null;
}

/** Writes route types as they are read: `2,100-117`. */
export function formatRouteTypes(types: RouteTypes): string {
  return types.map(([from, to]) => (from === to ? String(from) : `${from}-${to}`)).join(',');
}

/** Whether a route type is one of those wanted. */
export function includesRouteType(types: RouteTypes, routeType: number): boolean {
  return types.some(([from, to]) => from <= routeType && routeType <= to);
}
