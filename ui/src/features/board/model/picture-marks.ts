import type { Instant } from '@stubpost/shared';
import { stepMarkClass } from '../../../components/step-mark';
import type { StepNow, TurnNow } from '../../../lib/turn/turn-now';
import { markPitch, spacedMarks } from './mark-pitch';
import type { PictureItem, TurnScene } from './picture-scene';
import { isFarOffPlan } from '../../../lib/turn/turn-times';

/** The marks of one turn, and the right edge of the last of them. */
export interface Marks {
  items: PictureItem[];
  lastPixelAt: Instant | null;
}

/**
 * Marks on the work lane: recorded ones at their recorded time, others at their forecast finish. Acts in a cab lie in
 * the upper half of the bar, acts on the ground in the lower; within a half marks that would touch queue to the right.
 */
export function markItems(scene: TurnScene): Marks {
  const { turn } = scene;
  if (isFarOffPlan(turn)) return { items: [], lastPixelAt: null };
  const placed = turn.steps.flatMap((step) => {
    const at = markAt(step, turn);
    return at === null ? [] : [{ step, at }];
  });
  const halves = (['cab', 'ground'] as const).map((place) =>
    half(
      scene,
      placed.filter((mark) => mark.step.place === place),
    ),
  );
  const edges = halves.flatMap((one) => one.map((mark) => scene.after(mark.at, markPitch / 2)));
  const standing = turn.departedAt === null;
  return {
    items: halves.flat().map((mark) => markItem(scene, mark)),
    lastPixelAt: edges.length === 0 || !standing ? null : Math.max(...edges),
  };
}

interface PlacedMark {
  step: StepNow;
  at: Instant;
}

/**
 * Where a step's mark belongs; null where it has no place: an open step has none while nothing is heard, and after the
 * departure only what is recorded or still asked for has one.
 */
function markAt(step: StepNow, turn: TurnNow): Instant | null {
  if (step.doneAt !== null) return step.doneAt;
  if (step.holdsDeparture)
    return turn.departedAt === null && turn.health !== 'no-word' ? step.finishAt : null;
  return turn.departedAt !== null && step.state !== 'not-needed' ? step.dueAt : null;
}

function half(scene: TurnScene, marks: PlacedMark[]): PlacedMark[] {
  const sorted = [...marks].sort((a, b) => a.at - b.at);
  const origin = sorted[0]?.at ?? 0;
  const places = spacedMarks(sorted.map((mark) => scene.pixels(origin, mark.at)));
  return sorted.map((mark, index) => ({ ...mark, at: scene.after(origin, places[index] ?? 0) }));
}

function markItem(scene: TurnScene, { step, at }: PlacedMark): PictureItem {
  const className =
    `${stepMarkClass(step.kind, step.state, step.source)} ${step.place} ${ground(scene.turn, step)}`.trim();
  return scene.item('work', `mark ${step.key}`, { type: 'point', start: at, className, content: '' });
}

/** What the mark lies on, for its contrast: a done mark lies on the bar, one still to do on the paper right of it. */
function ground(turn: TurnNow, step: StepNow): string {
  if (step.doneAt === null) return '';
  if (turn.departedAt !== null) return step.doneAt > turn.departedAt ? '' : 'on-gone';
  if (turn.health === 'no-word') return step.doneAt > (turn.lastHeardAt ?? 0) ? '' : 'on-work';
  if (turn.health === 'short') return 'on-risk';
  const late = turn.health === 'late' && step.doneAt > (turn.scheduledDepartureAt ?? Infinity);
  return late ? 'on-late' : 'on-work';
}
