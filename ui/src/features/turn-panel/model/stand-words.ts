import type { WireTrack } from '@stubpost/shared';
import type { TurnNow } from '../../../lib/turn/turn-now';

/** Marker, room on the track and handbrakes by the records: "marker 9, platform fits 10 cars, 2 handbrakes set". */
export function standWords(turn: TurnNow, track: WireTrack | undefined): string {
  const marker = track?.markers?.find((one) => one.cars === turn.cars.length)?.label;
  const parts = [
    marker === undefined ? '' : `marker ${marker}`,
    track?.cars === undefined ? '' : `platform fits ${track.cars} ${track.cars === 1 ? 'car' : 'cars'}`,
    brakeWords(turn.securement),
  ];
  return parts.filter(Boolean).join(', ');
}

function brakeWords(securement: TurnNow['securement']): string {
  if (securement === null || securement.set === null) return '';
  const { set, released } = securement;
  const noun = set === 1 ? 'handbrake' : 'handbrakes';
  if (released === null || released === 0) return `${set} ${noun} set`;
  return released >= set ? `${noun} released` : `${released} of ${set} ${noun} released`;
}
