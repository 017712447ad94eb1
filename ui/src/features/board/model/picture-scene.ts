import type { Instant } from '@stubpost/shared';
import type { TurnNow } from '../../../lib/turn/turn-now';
import type { BoardRow } from './group-rows';
import type { TimeWindow } from './time-window';

/** One thing drawn on a lane. Looks hang on class names alone; content is plain text. */
export interface PictureItem {
  id: string;
  group: string;
  type: 'range' | 'point';
  start: Instant;
  end?: Instant;
  className: string;
  content: string;
}

/** How much is drawn: everything, without the comb of due times, or four cells in the place of the marks. */
export type Detail = 'full' | 'lean' | 'summary';

/** What the picture is drawn from. */
export interface Scene {
  rows: readonly BoardRow[];
  window: TimeWindow;
  now: Instant;
  pixelsPerMinute: number;
  detail: Detail;
  /** Writes a plan time in the terminal's zone. */
  clock: (instant: Instant) => string;
}

/** Where an item of a turn goes: its scene and the lanes of its row. */
export interface TurnScene {
  turn: TurnNow;
  now: Instant;
  window: TimeWindow;
  clock: (instant: Instant) => string;
  /** Pixels from one instant to another. */
  pixels: (from: Instant, to: Instant) => number;
  /** The instant so many pixels after another. */
  after: (instant: Instant, pixels: number) => Instant;
  item: (lane: Lane, name: string, item: Omit<PictureItem, 'id' | 'group'>) => PictureItem;
}

export const LANES = ['plan', 'work', 'next'] as const;
export type Lane = (typeof LANES)[number];

/** Name of a lane's group in the timeline: `track-3-plan`. */
export function laneGroup(rowId: string, lane: Lane): string {
  return `${rowId}-${lane}`;
}
