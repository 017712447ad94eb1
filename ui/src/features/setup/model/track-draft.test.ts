import { trackSchema, type WireTrack } from '@stubpost/shared';
import { draftOfTrack, markerSummary, readTracks, type TrackDraft } from './track-draft';

let made = 0;
const makeId = (): string => `row-${(made += 1)}`;
const track: WireTrack = {
  label: '3',
  lengthFeet: 850,
  cars: 9,
  gradePercent: -0.3,
  markers: [
    { cars: 4, label: '4' },
    { cars: 8, label: '8', direction: 'locomotive-at-post' },
  ],
};
const draft = (change: Partial<TrackDraft> = {}): TrackDraft => ({
  ...draftOfTrack(track, makeId),
  ...change,
});
const words = (...drafts: TrackDraft[]): string[] =>
  readTracks(drafts).problems.map((problem) => `${problem.field}: ${problem.words}`);

describe('tracks being edited', () => {
  it('read back as they were', () => {
    const { tracks, problems } = readTracks([draft()]);
    expect(problems).toEqual([]);
    expect(tracks).toEqual([track]);
  });

  it('may leave out what is not known', () => {
    const { tracks } = readTracks([draft({ lengthFeet: '', cars: ' ', gradePercent: '', markers: [] })]);
    expect(tracks).toEqual([{ label: '3' }]);
    expect(trackSchema.safeParse(tracks[0]).success).toBe(true);
  });

  it('say what is wrong beside the field', () => {
    expect(words(draft({ lengthFeet: '8,50', cars: '4.5', gradePercent: '12' }))).toEqual([
      'lengthFeet: Length in feet: a whole number from 1 to 10000.',
      'cars: Cars: a whole number from 1 to 40.',
      'gradePercent: Grade in percent: from -10 to 10.',
    ]);
    expect(words(draft({ label: ' ' }))).toEqual(['label: Label is missing.']);
    expect(words(draft(), draft())).toEqual(['label: Track 3 is named twice.']);
  });

  it('take a grade with the long minus that the screen shows', () => {
    expect(readTracks([draft({ gradePercent: '−0.3' })]).tracks[0]?.gradePercent).toBe(-0.3);
  });

  it('hold one marker for each train length and direction', () => {
    const marker = (cars: string, direction: 'both' | 'locomotive-away', label = 'A') => ({
      id: makeId(),
      cars,
      label,
      direction,
    });
    expect(words(draft({ markers: [marker('4', 'both'), marker('4', 'locomotive-away')] }))).toEqual([
      'markers: Two markers for 4 cars locomotive away from the post.',
    ]);
    expect(words(draft({ markers: [marker('x', 'both'), marker('4', 'both', '')] }))).toEqual([
      'markers: Marker: train length in cars, a whole number from 1 to 40.',
      'markers: Marker: a label of at most 12 characters.',
    ]);
  });

  it('tell their markers in one line', () => {
    expect(markerSummary(draft().markers)).toBe('4 cars: 4; 8 cars: 8 (locomotive at the post)');
    expect(markerSummary([])).toBe('none');
  });
});
