import { problemsOf, type RowReader, type TimetableDraft } from './draft';
import { includesRouteType } from './route-types';

/** Tells the routes trains run on from those of other modes. */
export function routeReader(draft: TimetableDraft): RowReader {
  const { leaveOut } = problemsOf(draft, 'routes.txt');
  return (field, line) => {
    const routeId = field('route_id');
    const type = field('route_type');
    if (!/^\d{1,4}$/.test(type)) {
      leaveOut(
        line,
        'route.type_unreadable',
        `“${type}” is not a route type. Route “${routeId}” is left out.`,
      );
      return;
    }
    if (draft.routes.has(routeId)) {
      leaveOut(line, 'route.twice', `Route “${routeId}” stands above already. This row is left out.`);
      return;
    }
    draft.routes.set(routeId, includesRouteType(draft.routeTypes, Number(type)));
  };
}
