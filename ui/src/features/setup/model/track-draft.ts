import type { StoppingMarker, WireTrack } from '@stubpost/shared';

/** Which way a marker holds for. */
export const DIRECTIONS = ['both', 'locomotive-at-post', 'locomotive-away'] as const;
export type Direction = (typeof DIRECTIONS)[number];

export const directionWords: Record<Direction, string> = {
  both: 'either way',
  'locomotive-at-post': 'locomotive at the post',
  'locomotive-away': 'locomotive away from the post',
};

/** A stopping marker while it is edited. */
export interface MarkerDraft {
  id: string;
  cars: string;
  label: string;
  direction: Direction;
}

/** A track while it is edited: numbers as they are typed. */
export interface TrackDraft {
  id: string;
  label: string;
  lengthFeet: string;
  cars: string;
  gradePercent: string;
  markers: MarkerDraft[];
}

/** Something to mend; the field is named as in the draft, for a marker with the marker's id. */
export interface TrackProblem {
  trackId: string;
  field: 'label' | 'lengthFeet' | 'cars' | 'gradePercent' | 'markers';
  markerId: string | null;
  words: string;
}

const text = (value: number | undefined): string => (value === undefined ? '' : String(value));

/** A track, ready to be edited. `makeId` gives the rows ids of their own. */
export function draftOfTrack(track: WireTrack, makeId: () => string): TrackDraft {
  return {
    id: makeId(),
    label: track.label,
    lengthFeet: text(track.lengthFeet),
    cars: text(track.cars),
    gradePercent: text(track.gradePercent),
    markers: (track.markers ?? []).map((marker) => ({
      id: makeId(),
      cars: String(marker.cars),
      label: marker.label,
      direction: marker.direction ?? 'both',
    })),
  };
}

interface NumberRule {
  field: 'lengthFeet' | 'cars' | 'gradePercent';
  name: string;
  lowest: number;
  highest: number;
  isWhole: boolean;
}

const numberRules: NumberRule[] = [
  { field: 'lengthFeet', name: 'Length in feet', lowest: 1, highest: 10_000, isWhole: true },
  { field: 'cars', name: 'Cars', lowest: 1, highest: 40, isWhole: true },
  { field: 'gradePercent', name: 'Grade in percent', lowest: -10, highest: 10, isWhole: false },
];

/** Reads a number between two limits; undefined where nothing is typed, null where it cannot be taken. */
function readNumber(
  typed: string,
  rule: Pick<NumberRule, 'lowest' | 'highest' | 'isWhole'>,
): number | undefined | null {
  const clean = typed.trim().replace('−', '-');
  if (clean === '') return undefined;
  const value = Number(clean);
  const isFine =
    Number.isFinite(value) &&
    value >= rule.lowest &&
    value <= rule.highest &&
    (!rule.isWhole || Number.isInteger(value));
  return isFine ? value : null;
}

const longestLabel = 12;

/** Tracks as typed, and everything that is wrong with them in the order of the rows. */
export function readTracks(drafts: readonly TrackDraft[]): { tracks: WireTrack[]; problems: TrackProblem[] } {
  const problems: TrackProblem[] = [];
  const tracks = drafts.map((draft) => readTrack(draft, drafts, problems));
  return { tracks, problems };
}

function readTrack(draft: TrackDraft, all: readonly TrackDraft[], problems: TrackProblem[]): WireTrack {
  const label = draft.label.trim();
  const say = (field: TrackProblem['field'], words: string): void => {
    problems.push({ trackId: draft.id, field, markerId: null, words });
  };
  if (label === '') say('label', 'Label is missing.');
  if (label.length > longestLabel) say('label', `Label: at most ${longestLabel} characters.`);
  const first = all.find((other) => other.label.trim() === label);
  if (label !== '' && first !== undefined && first.id !== draft.id)
    say('label', `Track ${label} is named twice.`);
  const numbers = Object.fromEntries(
    numberRules.flatMap((rule) => {
      const value = readNumber(draft[rule.field], rule);
      if (value === null)
        say(
          rule.field,
          `${rule.name}: ${rule.isWhole ? 'a whole number ' : ''}from ${rule.lowest} to ${rule.highest}.`,
        );
      return value === null || value === undefined ? [] : [[rule.field, value] as const];
    }),
  );
  const markers = readMarkers(draft, problems);
  return { label, ...numbers, ...(markers.length === 0 ? {} : { markers }) };
}

function readMarkers(draft: TrackDraft, problems: TrackProblem[]): StoppingMarker[] {
  const seen = new Set<string>();
  return draft.markers.flatMap((marker): StoppingMarker[] => {
    const say = (words: string): StoppingMarker[] => {
      problems.push({ trackId: draft.id, field: 'markers', markerId: marker.id, words });
      return [];
    };
    const cars = readNumber(marker.cars, { lowest: 1, highest: 40, isWhole: true });
    const label = marker.label.trim();
    if (typeof cars !== 'number') return say('Marker: train length in cars, a whole number from 1 to 40.');
    if (label === '' || label.length > longestLabel)
      return say(`Marker: a label of at most ${longestLabel} characters.`);
    const clash = [`${cars} ${marker.direction}`, ...(marker.direction === 'both' ? [] : [`${cars} both`])];
    if (clash.some((each) => seen.has(each)))
      return say(`Two markers for ${cars} cars ${directionWords[marker.direction]}.`);
    seen.add(`${cars} ${marker.direction}`);
    return [marker.direction === 'both' ? { cars, label } : { cars, label, direction: marker.direction }];
  });
}

/** Markers of a track in one line: "4 cars: 4; 8 cars: 8". */
export function markerSummary(markers: readonly MarkerDraft[]): string {
  if (markers.length === 0) return 'none';
  return markers
    .map(
      ({ cars, label, direction }) =>
        `${cars} cars: ${label}${direction === 'both' ? '' : ` (${directionWords[direction]})`}`,
    )
    .join('; ');
}
