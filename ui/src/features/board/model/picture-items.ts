import { millisecondsInMinute } from '@stubpost/shared';
import { formatSlack } from '../../../lib/time-display';
import type { TurnNow } from '../../../lib/turn/turn-now';
import { planText } from './mark-pitch';
import { laneGroup, type Detail, type PictureItem, type Scene, type TurnScene } from './picture-scene';
import { markItems } from './picture-marks';
import { overlaps, type TimeWindow } from './time-window';
import { nextLane, workLane, type NextLane, type WorkLane } from './turn-picture';
import {
  arrivalOf,
  isFarOffPlan,
  isOver,
  isUntaken,
  plannedStretch,
  shownSlack,
  shownStretch,
} from '../../../lib/turn/turn-times';
import { wordItems } from './picture-words';

/** Everything to draw in a window, for the turns that reach into it. */
export function pictureItems(scene: Scene): PictureItem[] {
  return scene.rows.flatMap((row) =>
    row.turns
      .filter((turn) => overlaps(shownStretch(turn, scene.now), scene.window))
      .flatMap((turn) => turnItems(turnScene(scene, row.id, turn), scene.detail)),
  );
}

function turnScene(scene: Scene, rowId: string, turn: TurnNow): TurnScene {
  const perMillisecond = scene.pixelsPerMinute / millisecondsInMinute;
  return {
    turn,
    now: scene.now,
    window: scene.window,
    clock: scene.clock,
    pixels: (from, to) => (to - from) * perMillisecond,
    after: (instant, pixels) => instant + pixels / perMillisecond,
    item: (lane, name, item) => ({ id: `${turn.id} ${name}`, group: laneGroup(rowId, lane), ...item }),
  };
}

function turnItems(scene: TurnScene, detail: Detail): PictureItem[] {
  const work = workLane(scene.turn, scene.now);
  const next = nextLane(scene.turn, scene.now);
  if (detail === 'summary') {
    return [
      ...planItems(scene),
      ...workItems(scene, work),
      ...summaryItems(scene),
      ...figureItems(scene, next),
    ];
  }
  const marks = markItems(scene);
  return [
    ...planItems(scene),
    ...(detail === 'full' ? dueItems(scene) : []),
    ...workItems(scene, work),
    ...marks.items,
    ...wordItems(scene, work, marks.lastPixelAt),
    ...nextItems(scene, next),
    ...figureItems(scene, next),
  ];
}

const classes = (...names: (string | false | null)[]): string => names.filter(Boolean).join(' ');

function planItems({ turn, item, pixels, clock, window }: TurnScene): PictureItem[] {
  const { from, to } = plannedStretch(turn);
  const state = classes(turn.departedAt !== null && 'gone', turn.annulled !== null && 'annulled');
  // A bar that began before the window has only its visible part for its text.
  const fits = planText(pixels(Math.max(from, window.from), to));
  const leaves = turn.scheduledDepartureAt;
  const outbound = leaves === null ? '' : turn.outboundTrain;
  const right = [fits.outbound && outbound, fits.time && leaves !== null && clock(leaves)].filter(Boolean);
  const left = fits.inbound || (leaves === null && fits.outbound) ? (turn.inboundTrain ?? '') : '';
  const range = { type: 'range' as const, start: from, end: to };
  return [
    item('plan', 'plan', { ...range, className: classes('plan', state), content: left }),
    item('plan', 'leaves', { ...range, className: classes('plan-leaves', state), content: right.join(' ') }),
  ];
}

function dueItems({ turn, item }: TurnScene): PictureItem[] {
  const { from, to } = plannedStretch(turn);
  return turn.steps.flatMap((step) => {
    const at = step.plannedDueAt;
    if (at === null || at < from || at > to || turn.annulled !== null) return [];
    return [item('plan', `due ${step.key}`, { type: 'point', start: at, className: 'due', content: '' })];
  });
}

function workItems({ turn, item }: TurnScene, lane: WorkLane): PictureItem[] {
  const blue = turn.blueSignal !== null && 'blue-signal';
  const left = turn.departedAt !== null || turn.state === 'closed';
  const health = !left && (turn.health === 'tight' || turn.health === 'short') && turn.health;
  const pieces: [string, TimeWindow | null, string][] = [
    ['work', lane.work, classes('work', turn.arrivedAt === null && 'unposted', left && 'gone', health, blue)],
    ['over', lane.over, 'over'],
    ['unheard', lane.unheard, 'unheard'],
    [
      'open',
      lane.open,
      classes('open', turn.arrivedAt === null && turn.kind !== 'first-out' && 'coming', blue),
    ],
  ];
  return pieces.flatMap(([name, piece, className]) =>
    piece === null
      ? []
      : [item('work', name, { type: 'range', start: piece.from, end: piece.to, className, content: '' })],
  );
}

function nextItems({ turn, item, now }: TurnScene, lane: NextLane | null): PictureItem[] {
  if (lane === null) return [];
  const range = (name: string, piece: TimeWindow, className: string): PictureItem =>
    item('next', name, { type: 'range', start: piece.from, end: piece.to, className, content: '' });
  const bracket = classes('bracket', turn.health === 'late' && 'late');
  const half = { type: 'point' as const, start: lane.readyAt ?? 0, className: 'half', content: '' };
  return [
    ...lane.hatches.map((piece, index) => range(`hatch ${index}`, piece, 'hatch')),
    ...lane.rooms.map((piece, index) => range(`room ${index}`, piece, 'room')),
    ...(lane.bracket === null ? [] : [range('bracket', lane.bracket, bracket)]),
    ...(lane.readyAt === null || lane.readyAt <= now ? [] : [item('next', 'half', half)]),
  ];
}

function figureItems({ turn, item }: TurnScene, lane: NextLane | null): PictureItem[] {
  const slack = shownSlack(turn);
  if (lane === null || slack === null) return [];
  const content = formatSlack(slack);
  return [item('next', 'figure', { type: 'point', start: lane.figureAt, className: 'figure', content })];
}

/** Four cells, set / tested / ends / ready, filled where all steps of that kind before the departure are recorded. */
function summaryItems({ turn, item }: TurnScene): PictureItem[] {
  const start = arrivalOf(turn) ?? plannedStretch(turn).from;
  if (isFarOffPlan(turn)) return [];
  const cells = summaryCells(turn);
  const filled = (Object.keys(cells) as (keyof typeof cells)[]).filter((cell) => cells[cell]);
  const urgent = !isOver(turn) && turn.health !== 'on-plan' && `at-risk ${turn.health}`;
  const className = classes('cells', ...filled, urgent, isUntaken(turn) && 'untaken');
  return [item('work', 'cells', { type: 'point', start, className, content: '' })];
}

/** Which of the four cells of the summary are filled. */
export function summaryCells(turn: TurnNow): {
  set: boolean;
  tested: boolean;
  ends: boolean;
  ready: boolean;
} {
  const inward = turn.steps.filter((step) => step.anchor === 'arrival');
  const all = (steps: TurnNow['steps']): boolean => steps.every((step) => step.doneAt !== null);
  const some = (steps: TurnNow['steps']): boolean => steps.length > 0 && all(steps);
  return {
    set: some(inward.filter((step) => step.kind === 'securement')),
    tested: some(inward.filter((step) => step.kind === 'brake-test')),
    ends: some(inward.filter((step) => step.kind === 'ends')),
    ready: some(turn.steps.filter((step) => step.holdsDeparture && step.state !== 'not-needed')),
  };
}

/** More than this many items in view no longer move fluidly. */
export const mostItems = 500;

/** As much detail as the length of the window and the number of items allow. */
export function detailedItems(scene: Omit<Scene, 'detail'>, summary: boolean): PictureItem[] {
  if (summary) return pictureItems({ ...scene, detail: 'summary' });
  for (const detail of ['full', 'lean'] as const) {
    const items = pictureItems({ ...scene, detail });
    if (items.length <= mostItems) return items;
  }
  return pictureItems({ ...scene, detail: 'summary' });
}
