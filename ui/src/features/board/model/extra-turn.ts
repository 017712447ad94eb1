import { formatInstant, type CreateTurnRequest } from '@stubpost/shared';
import { nearestInstantOfTime, readTimeOfDay } from '../../../lib/time-entry';
import { serviceDateAt } from './service-dates';

/** What stands in the fields of an extra turn, as typed. */
export interface ExtraTurnFields {
  inboundTrain: string;
  arrives: string;
  outboundTrain: string;
  leaves: string;
  track: string;
  set: string;
}

export const emptyFields: ExtraTurnFields = {
  inboundTrain: '',
  arrives: '',
  outboundTrain: '',
  leaves: '',
  track: '',
  set: '',
};

export interface FieldFault {
  field: keyof ExtraTurnFields;
  words: string;
}

export type ExtraTurnResult = { ok: true; request: CreateTurnRequest } | { ok: false; faults: FieldFault[] };

/**
 * Reads the fields of an extra turn. Times are typed as on the terminal's clock. An arrival means the moment nearest to
 * now, past or to come; a departure the one nearest to the arrival, and never one before it.
 */
export function readExtraTurn(
  fields: ExtraTurnFields,
  terminal: { code: string; zone: string },
  now: number,
): ExtraTurnResult {
  const faults: FieldFault[] = [];
  const arrival = readEnd(fields.inboundTrain, fields.arrives, ['inboundTrain', 'arrives'], faults);
  const departure = readEnd(fields.outboundTrain, fields.leaves, ['outboundTrain', 'leaves'], faults);
  if (faults.length === 0 && arrival === null && departure === null) {
    faults.push({
      field: 'outboundTrain',
      words: 'Give the train that comes in, the train that leaves, or both',
    });
  }
  if (faults.length > 0) return { ok: false, faults };
  const { zone } = terminal;
  const arrivesAt = arrival === null ? null : nearestInstantOfTime(arrival.seconds, zone, now);
  const leavesAt =
    departure === null ? null : nearestInstantOfTime(departure.seconds, zone, arrivesAt ?? now);
  if (arrivesAt !== null && leavesAt !== null && leavesAt < arrivesAt) {
    return { ok: false, faults: [{ field: 'leaves', words: 'The departure lies before the arrival' }] };
  }
  const request: CreateTurnRequest = {
    terminal: terminal.code,
    serviceDate: serviceDateAt(arrivesAt ?? leavesAt ?? now, zone),
    ...(fields.track.trim() !== '' && { track: fields.track.trim() }),
    ...(fields.set.trim() !== '' && { set: fields.set.trim() }),
    ...(arrival !== null && arrivesAt !== null
      ? { inbound: { train: arrival.train, scheduledArrivalAt: formatInstant(arrivesAt) } }
      : {}),
    ...(departure !== null && leavesAt !== null
      ? { outbound: { train: departure.train, scheduledDepartureAt: formatInstant(leavesAt) } }
      : {}),
  };
  return { ok: true, request };
}

function readEnd(
  train: string,
  time: string,
  [trainField, timeField]: [keyof ExtraTurnFields, keyof ExtraTurnFields],
  faults: FieldFault[],
): { train: string; seconds: number } | null {
  const [name, typed] = [train.trim(), time.trim()];
  if (name === '' && typed === '') return null;
  if (name === '') faults.push({ field: trainField, words: 'Which train? Give its number' });
  const seconds = readTimeOfDay(typed);
  if (seconds === null) faults.push({ field: timeField, words: 'Give the time as 17:40' });
  return seconds === null || name === '' ? null : { train: name, seconds };
}
