import { DataSet } from 'vis-data/esnext';
import { useEffect, useState } from 'react';
import { createRoot } from 'react-dom/client';
import { Timeline } from 'vis-timeline/esnext';
import { TimelinePicture } from '../src/features/board/components/timeline-picture';
import { laneGroup, LANES, type PictureItem } from '../src/features/board/model/picture-scene';
import '../src/styles/index.css';

/** A day of a large terminal: rows, items spread over 24 hours, four of them in view. */
const rowCount = 20;
const itemCount = 2000;
const day = 24 * 3_600_000;
const start = Date.parse('2026-03-03T05:00:00Z');
const window4h = { from: start + 8 * 3_600_000, to: start + 12 * 3_600_000 };
const now = start + 9 * 3_600_000;
const rowIds = Array.from({ length: rowCount }, (_, row) => `track-${row + 1}`);

function makeItems(shiftMilliseconds: number, shiftedCount: number): PictureItem[] {
  return Array.from({ length: itemCount }, (_, index) => {
    const from =
      start + (index / itemCount) * day + (index % (itemCount / shiftedCount) === 0 ? shiftMilliseconds : 0);
    const lane = LANES[index % LANES.length] ?? 'work';
    return {
      id: `turn-${index} ${lane}`,
      group: laneGroup(rowIds[index % rowCount] ?? '', lane),
      type: 'range',
      start: from,
      end: from + 900_000,
      className: lane === 'work' ? 'work' : lane === 'plan' ? 'plan' : 'hatch',
      content: lane === 'plan' ? String(1000 + index) : '',
    };
  });
}

const frame = (): Promise<void> => new Promise((resolve) => requestAnimationFrame(() => resolve()));
const twoFrames = async (): Promise<void> => {
  await frame();
  await frame();
};

let setItems: (items: PictureItem[]) => void = () => undefined;

function Picture() {
  const [items, set] = useState(() => makeItems(0, 100));
  useEffect(() => {
    setItems = set;
  }, []);
  return (
    <TimelinePicture
      rowIds={rowIds}
      items={items}
      window={window4h}
      now={now}
      zone="America/New_York"
      clock={null}
      pixelsPerMinute={1104 / 240}
      onWidth={() => undefined}
      onDrag={() => undefined}
      onPick={() => undefined}
    />
  );
}

async function untilDrawn(host: Element): Promise<void> {
  while (host.querySelector('.vis-item') === null) await frame();
  await frame();
}

function freshHost(): HTMLElement {
  const host = document.getElementById('root');
  if (host === null) throw new Error('the bench page has no root');
  host.replaceChildren(document.createElement('div'));
  return host.firstElementChild as HTMLElement;
}

/** First draw and one update of 100 items, in milliseconds, of our picture. */
async function ours(): Promise<{ draw: number; update: number }> {
  const host = freshHost();
  const began = performance.now();
  const root = createRoot(host);
  root.render(<Picture />);
  await untilDrawn(host);
  const draw = performance.now() - began;
  await twoFrames();
  const updating = performance.now();
  setItems(makeItems(60_000, 100));
  await twoFrames();
  const update = performance.now() - updating;
  root.unmount();
  return { draw, update };
}

/** The same of the library alone, with the same rows and items. */
async function bare(): Promise<{ draw: number; update: number }> {
  const host = freshHost();
  const began = performance.now();
  const groups = rowIds.flatMap((rowId) =>
    LANES.map((lane) => ({ id: laneGroup(rowId, lane), content: '' })),
  );
  const items = new DataSet(makeItems(0, 100).map((item) => ({ ...item })));
  const timeline = new Timeline(host, items, groups, {
    stack: false,
    start: window4h.from,
    end: window4h.to,
  });
  await untilDrawn(host);
  const draw = performance.now() - began;
  await twoFrames();
  const updating = performance.now();
  items.update(
    makeItems(60_000, 100)
      .filter((_, index) => index % 20 === 0)
      .map((item) => ({ ...item })),
  );
  await twoFrames();
  const update = performance.now() - updating;
  timeline.destroy();
  return { draw, update };
}

Object.assign(globalThis, { bench: { ours, bare } });
