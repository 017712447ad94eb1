import { orNull, problemsOf, type RowReader, type TimetableDraft } from './draft';

/** Trips on the wanted routes. What the row says of other modes is not looked at. */
export function tripReader(draft: TimetableDraft): RowReader {
  const { leaveOut } = problemsOf(draft, 'trips.txt');
  return (field, line) => {
    const tripId = field('trip_id');
    const isTrain = draft.routes.get(field('route_id'));
    if (isTrain === false) {
      draft.passedOver.set(tripId, 'other-mode');
      return;
    }
    if (draft.trips.has(tripId)) {
      leaveOut(line, 'trip.twice', `Trip “${tripId}” stands above already. This row is left out.`);
      return;
    }
    const serviceId = field('service_id');
    const unknown = isTrain === undefined ? `Route “${field('route_id')}”` : `Service “${serviceId}”`;
    if (isTrain === undefined || !draft.services.has(serviceId)) {
      const code = isTrain === undefined ? 'trip.route_unknown' : 'trip.service_unknown';
      leaveOut(line, code, `${unknown} is not in the file. Trip “${tripId}” is left out.`);
      draft.passedOver.set(tripId, 'left-out');
      return;
    }
    draft.trips.set(tripId, {
      tripId,
      shortName: orNull(field('trip_short_name')),
      serviceId,
      blockId: orNull(field('block_id')),
      direction: orNull(field('direction_id')),
      line,
      calls: [],
      windows: null,
    });
  };
}
