import type { CalendarDate } from '../lib/instant';

/** A stop, platform or station that a train of the timetable uses. */
export interface TimetableStop {
  stopId: string;
  name: string;
  /** Short public code of the stop, when it has one. */
  code: string | null;
  /** The platform's own identifier ("3"), when it has one. */
  platform: string | null;
  /** The top of the parent chain; the stop itself when it stands alone. */
  stationId: string;
  /** Whether trains of the timetable call here, and whether only other modes do. */
  calledAt: 'by-train' | 'by-others' | 'never';
}

/** On which days a group of trips runs: a weekly rule with days added and days removed. */
export interface TimetableService {
  serviceId: string;
  /** Monday to Sunday. */
  weekdays: boolean[];
  /** First and last day of the weekly rule, both included; null when there is no weekly rule. */
  from: CalendarDate | null;
  to: CalendarDate | null;
  added: CalendarDate[];
  removed: CalendarDate[];
}

/** One run of a train with what is needed of its two ends. Times are seconds after the service day's start. */
export interface TimetableTrip {
  tripId: string;
  /** Number or name that crews know the train by; the trip id when the file has none. */
  train: string;
  serviceId: string;
  blockId: string | null;
  direction: string | null;
  firstStopId: string;
  departureSeconds: number;
  lastStopId: string;
  arrivalSeconds: number;
  /** Stations of the second and the last-but-one call, to tell whether the next train goes back the same way. */
  secondStationId: string;
  lastButOneStationId: string;
  /** Line of the trip in `trips.txt`. */
  line: number;
}

/** Two trips that the file says are made with the same vehicle; wins over the block. */
export interface TimetableLink {
  fromTripId: string;
  toTripId: string;
}

/** What is kept of an imported timetable: plain values, fit for JSON. */
export interface Timetable {
  /** IANA zone of all its times. */
  zone: string;
  agency: string;
  stops: TimetableStop[];
  services: TimetableService[];
  trips: TimetableTrip[];
  links: TimetableLink[];
}
