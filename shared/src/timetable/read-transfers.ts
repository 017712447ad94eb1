import { problemsOf, type RowReader, type TimetableDraft } from './draft';

/**
 * Links between trips made with the same vehicle: transfer types 4 (riders may stay aboard) and 5 (they must get
 * off). Other transfers are about riders and are not looked at. Source: GTFS Schedule reference, linked trips.
 */
export function transferReader(draft: TimetableDraft): RowReader {
  const { leaveOut } = problemsOf(draft, 'transfers.txt');
  return (field, line) => {
    const type = field('transfer_type');
    if (type !== '4' && type !== '5') return;
    const ids = [field('from_trip_id'), field('to_trip_id')] as const;
    if (ids.some((id) => draft.passedOver.has(id))) return;
    const unknown = ids.find((id) => !draft.trips.has(id));
    if (unknown !== undefined) {
      const what = unknown === '' ? 'A link names no trip' : `Trip “${unknown}” is not in the file`;
      leaveOut(line, 'link.trip_unknown', `${what}. The link is left out.`);
      return;
    }
    if (ids.some((id) => draft.trips.get(id)?.windows !== null)) {
      leaveOut(
        line,
        'link.of_spaced_trip',
        `A link of a trip that repeats names no single run. It is left out.`,
      );
      return;
    }
    draft.links.push({ fromTripId: ids[0], toTripId: ids[1], line });
  };
}
