import type { WireTrack, WireTurn } from '@stubpost/shared';
import { formatTime } from '../../../lib/time-display';
import { readTurn, type TurnNow } from '../../../lib/turn/turn-now';
import { trackStretch } from '../../../lib/turn/turn-times';

/** What moving a turn to a track means, in words: before and after, length, marker, trains that are there meanwhile. */
export function trackWords(
  turn: TurnNow,
  to: string,
  tracks: readonly WireTrack[],
  others: readonly WireTurn[],
): string[] {
  const track = tracks.find((one) => one.label === to);
  const cars = turn.cars.length;
  const marker = track?.markers?.find((one) => one.cars === cars)?.label;
  const words = [
    `Train ${turn.train}: ${turn.track === null ? 'no track' : `track ${turn.track}`} to track ${to}.`,
  ];
  if (track === undefined) words.push(`Track ${to} is not known at this terminal; it will be added.`);
  if (track?.cars !== undefined && cars > track.cars)
    words.push(`Too long: ${cars} cars, track ${to} fits ${track.cars}.`);
  if (marker !== undefined) words.push(`Stops at marker ${marker}.`);
  return [...words, ...clashWords(turn, to, others)];
}

function clashWords(turn: TurnNow, to: string, others: readonly WireTurn[]): string[] {
  const own = trackStretch(turn, 0);
  const seen = new Set<string>([turn.id]);
  return others.flatMap((wire) => {
    if (wire.track !== to || wire.annulled !== null || seen.has(wire.id)) return [];
    seen.add(wire.id);
    const other = readTurn(wire);
    const { from, to: until } = trackStretch(other, 0);
    if (from >= own.to || until <= own.from) return [];
    const zone = turn.zone;
    return [`Train ${other.train} is there ${formatTime(from, zone)} to ${formatTime(until, zone)}.`];
  });
}
