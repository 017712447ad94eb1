/** The demo's railroad. Places, lines and numbers are invented. */
export const demoZone = 'America/New_York';

/** Name of the invented railroad, as its timetable names the agency. */
export const demoAgency = 'Ostrel Valley Railroad (invented)';

/** A terminal of the demo with its platforms, the longest first where they differ. */
export interface DemoTerminal {
  code: string;
  name: string;
  stationId: string;
  tracks: ReadonlyArray<{ label: string; lengthFeet: number; cars: number; gradePercent: number }>;
}

const track = (label: string, cars: number, gradePercent: number) => ({
  label,
  // A coach of the demo is 85 ft over couplers; 40 ft stay free at the bumping post.
  lengthFeet: cars * 85 + 40,
  cars,
  gradePercent,
});

export const demoTerminals: readonly DemoTerminal[] = [
  {
    code: 'OSQ',
    name: 'Ostrel Quay',
    stationId: 'ostrel-quay',
    tracks: [
      track('1', 6, 0),
      track('2', 8, 0),
      track('3', 10, 0),
      track('4', 10, 0),
      track('5', 10, 0.2),
      track('6', 8, 0.2),
      track('7', 8, 0.2),
      track('8', 6, 0.2),
    ],
  },
  {
    code: 'PEL',
    name: 'Pellmoor',
    stationId: 'pellmoor',
    tracks: [track('1', 8, 0.4), track('2', 8, 0.4), track('3', 10, 0), track('4', 6, 0)],
  },
  {
    code: 'WIN',
    name: 'Winnock Head',
    stationId: 'winnock-head',
    tracks: [track('1', 6, 0.8), track('2', 6, 0.8)],
  },
];

/** One line of the railroad: always between the Quay and an outer terminal. */
export interface DemoLine {
  routeId: string;
  name: string;
  outer: string;
  /** Scheduled minutes end to end. */
  runMinutes: number;
  /** Stations on the way, from the Quay. */
  between: readonly string[];
  /** First digits of the train numbers: even ones run towards the Quay. */
  numbersFrom: number;
  /** Minutes after 05:00 of the first train from the Quay and from the outer terminal. */
  firstTrains: { fromQuay: number; fromOuter: number };
  /** Minutes between trains in the rush and outside it. */
  rushHeadwayMinutes: number;
  headwayMinutes: number;
  /** Minutes between the few trains after midnight. */
  nightHeadwayMinutes: number;
}

export const demoLines: readonly DemoLine[] = [
  {
    routeId: 'moor-line',
    name: 'Moor Line',
    outer: 'pellmoor',
    runMinutes: 45,
    between: ['Saltgate', 'Ferrow', 'Hollin Cross', 'Dunmarsh', 'Pell Bridge'],
    numbersFrom: 1600,
    firstTrains: { fromQuay: 0, fromOuter: 28 },
    rushHeadwayMinutes: 15,
    headwayMinutes: 30,
    nightHeadwayMinutes: 60,
  },
  {
    routeId: 'head-line',
    name: 'Head Line',
    outer: 'winnock-head',
    runMinutes: 36,
    between: ['Saltgate', 'Orrin Mill', 'Cable Strand'],
    numbersFrom: 2200,
    firstTrains: { fromQuay: 7, fromOuter: 17 },
    rushHeadwayMinutes: 20,
    headwayMinutes: 40,
    nightHeadwayMinutes: 60,
  },
];
