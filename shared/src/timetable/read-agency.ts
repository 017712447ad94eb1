import { problemsOf, type RowReader, type TimetableDraft } from './draft';
import { isZone } from './service-day';

/** All times of the file are in the zone of its agencies, so they must agree on it. */
export function agencyReader(draft: TimetableDraft): RowReader {
  const { refuse } = problemsOf(draft, 'agency.txt');
  return (field, line) => {
    const zone = field('agency_timezone');
    if (draft.agency === null) {
      if (!isZone(zone)) refuse(line, 'agency.zone_unknown', `“${zone}” is not a time zone.`);
      draft.agency = { name: field('agency_name'), zone };
    } else if (zone !== draft.agency.zone) {
      const message = `The agencies differ in their time zone: “${zone}” here, “${draft.agency.zone}” above.`;
      refuse(line, 'agency.zones_differ', message);
    }
  };
}
