import type { Instant } from '@stubpost/shared';
import type { PictureItem, TurnScene } from './picture-scene';
import type { WorkLane } from './turn-picture';
import { arrivalOf, isUntaken, plannedStretch } from '../../../lib/turn/turn-times';
import { healthFlag } from '../../../lib/turn/health-flag';

/** Words beside a bar: what is the matter with the turn, right of its last mark. */
export function wordItems(scene: TurnScene, lane: WorkLane, lastPixelAt: Instant | null): PictureItem[] {
  const { turn, now, item, clock } = scene;
  const point = (name: string, start: Instant, className: string, content: string): PictureItem =>
    item('work', name, { type: 'point', start, className, content });
  if (turn.annulled !== null) {
    const at = turn.annulled.at === null ? '' : ` ${clock(turn.annulled.at)}`;
    const words = `Annulled${at}, ${turn.annulled.reason}`;
    return [point('flag', plannedStretch(turn).from, 'flag annulled', words)];
  }
  if (turn.departedAt !== null) return runningTestWords(scene, point);
  const standsFrom = turn.arrivedAt === null ? (arrivalOf(turn) ?? now) : now;
  const words: PictureItem[] = [];
  if (turn.blueSignal !== null) words.push(point('blue', standsFrom, 'flag blue-signal', 'Blue signal'));
  const health = healthFlag(turn, now);
  if (health === null || turn.state === 'scheduled') return words;
  const right = Math.max(lane.open?.to ?? now, lastPixelAt ?? 0);
  const start = turn.health === 'no-word' ? now : right;
  const untaken = isUntaken(turn) ? ' untaken' : '';
  return [...words, point('flag', start, `flag ${turn.health}${untaken}`, health)];
}

function runningTestWords(
  { turn, clock, after }: TurnScene,
  point: (name: string, start: Instant, className: string, content: string) => PictureItem,
): PictureItem[] {
  return turn.steps.flatMap((step) => {
    const owed = !step.holdsDeparture && step.doneAt === null && step.state !== 'not-needed';
    if (!owed || step.dueAt === null) return [];
    const words = `${step.shortLabel.toLowerCase()} due ${clock(step.dueAt)}`;
    return [point(`said ${step.key}`, after(step.dueAt, 7), 'said', words)];
  });
}
