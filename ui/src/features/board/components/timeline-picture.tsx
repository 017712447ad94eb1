import { DataSet } from 'vis-data/esnext';
import { useEffect, useRef, useState } from 'react';
import { Timeline, type DataGroup, type DataItem } from 'vis-timeline/esnext';
import 'vis-timeline/styles/vis-timeline-graph2d.min.css';
import type { Instant } from '@stubpost/shared';
import { axisStep } from '../model/axis-labels';
import { diffItems } from '../model/diff-items';
import { laneGroup, LANES, type PictureItem } from '../model/picture-scene';
import type { TimeWindow } from '../model/time-window';
import './lanes.css';
import styles from './timeline-picture.module.css';
import { timelineOptions, type AxisState } from './timeline-options';

export interface TimelinePictureProps {
  /** Rows from top to bottom; each takes three lanes. */
  rowIds: readonly string[];
  items: readonly PictureItem[];
  window: TimeWindow;
  now: Instant;
  zone: string;
  /** "17:26:40" on the now line; null when now lies outside the window. */
  clock: string | null;
  pixelsPerMinute: number;
  /** Width of the picture whenever it changes. */
  onWidth: (pixels: number) => void;
  /** The person dragged or zoomed the picture itself. */
  onDrag: (window: TimeWindow) => void;
  /** A turn was clicked; only an extra, since every turn is in the table beside it. */
  onPick: (turnId: string) => void;
}

const pastId = 'past';

/**
 * The picture of the board. The library draws bars and keeps what is out of view out of the page; what is drawn comes as
 * ready items, by class name and plain text. Hidden from assistive technology: the table beside it says the same.
 */
export function TimelinePicture(props: TimelinePictureProps) {
  const host = useRef<HTMLDivElement>(null);
  const timeline = useTimeline(host, props);
  useItems(timeline, props);
  useFollowing(timeline, props);
  useWidth(host, props.onWidth);
  const nowPixels = ((props.now - props.window.from) / 60_000) * props.pixelsPerMinute;
  return (
    <div className={styles.picture} aria-hidden="true">
      <div className={styles.overAxis}>
        {props.clock !== null && (
          <b className={styles.clock} style={{ left: nowPixels }}>
            {props.clock}
          </b>
        )}
      </div>
      <div className={`lanes ${styles.host}`} ref={host} />
    </div>
  );
}

interface Drawing {
  timeline: Timeline;
  items: DataSet<DataItem>;
  groups: DataSet<DataGroup>;
  drawn: Map<string, PictureItem>;
  axis: AxisState;
  isDragging: boolean;
}

/** One timeline for the life of the component; destroyed with it. */
function useTimeline(host: React.RefObject<HTMLDivElement>, props: TimelinePictureProps): Drawing | null {
  const [drawing, setDrawing] = useState<Drawing | null>(null);
  const latest = useRef(props);
  latest.current = props;
  const { zone } = props;
  useEffect(() => {
    const element = host.current;
    if (element === null) return undefined;
    const { window: shown, now, pixelsPerMinute } = latest.current;
    const axis: AxisState = { zone, now, pixelsPerMinute };
    const items = new DataSet<DataItem>();
    const groups = new DataSet<DataGroup>();
    const options = timelineOptions(axis, { start: shown.from, end: shown.to });
    const made = new Timeline(element, items, groups, options);
    const created: Drawing = { timeline: made, items, groups, drawn: new Map(), axis, isDragging: false };
    made.on('rangechange', ({ byUser }: { byUser: boolean }) => {
      if (byUser) created.isDragging = true;
    });
    made.on('rangechanged', ({ byUser, start, end }: { byUser: boolean; start: Date; end: Date }) => {
      if (!byUser) return;
      created.isDragging = false;
      latest.current.onDrag({ from: start.valueOf(), to: end.valueOf() });
    });
    made.on('click', ({ item }: { item: string | number | null }) => {
      const turnId = String(item ?? '').split(' ')[0] ?? '';
      if (turnId !== '' && turnId !== pastId) latest.current.onPick(turnId);
    });
    setDrawing(created);
    return () => {
      made.destroy();
      setDrawing(null);
    };
  }, [host, zone]);
  return drawing;
}

/** Tells the timeline what is new and what is gone; the rest is not touched. */
function useItems(
  drawing: Drawing | null,
  { rowIds, items, window: shown, now }: TimelinePictureProps,
): void {
  const rows = rowIds.join('\n');
  useEffect(() => {
    if (drawing === null) return;
    const wanted =
      rows === ''
        ? []
        : rows.split('\n').flatMap((rowId, row) =>
            LANES.map((lane, index) => ({
              id: laneGroup(rowId, lane),
              content: '',
              className: `${lane}-lane`,
              order: row * LANES.length + index,
            })),
          );
    const gone = drawing.groups.getIds().filter((id) => !wanted.some((group) => group.id === id));
    drawing.groups.update(wanted);
    if (gone.length > 0) drawing.groups.remove(gone);
  }, [drawing, rows]);

  useEffect(() => {
    if (drawing === null) return;
    const { changed, removed } = diffItems(drawing.drawn, items);
    if (removed.length > 0) drawing.items.remove(removed);
    const past: DataItem[] =
      now > shown.from
        ? [
            {
              id: pastId,
              type: 'background',
              start: shown.from - 6 * 3_600_000,
              end: now,
              className: 'past',
              content: '',
            },
          ]
        : [];
    drawing.items.update([...past, ...changed.map((item) => ({ ...item }))]);
    for (const item of changed) drawing.drawn.set(item.id, item);
    for (const id of removed) drawing.drawn.delete(id);
  }, [drawing, items, now, shown.from]);
}

/** Once a second: now line and window, without animation, unless a hand is on the picture. */
function useFollowing(drawing: Drawing | null, props: TimelinePictureProps): void {
  const { window: shown, now, pixelsPerMinute } = props;
  useEffect(() => {
    if (drawing === null) return;
    drawing.axis.now = now;
    if (drawing.axis.pixelsPerMinute !== pixelsPerMinute) {
      drawing.axis.pixelsPerMinute = pixelsPerMinute;
      drawing.timeline.setOptions({ timeAxis: axisStep(pixelsPerMinute) });
    }
    drawing.timeline.setCurrentTime(now);
    if (!drawing.isDragging) drawing.timeline.setWindow(shown.from, shown.to, { animation: false });
  }, [drawing, shown.from, shown.to, now, pixelsPerMinute]);
}

function useWidth(host: React.RefObject<HTMLDivElement>, onWidth: (pixels: number) => void): void {
  const latest = useRef(onWidth);
  latest.current = onWidth;
  useEffect(() => {
    const element = host.current;
    if (element === null) return undefined;
    const measure = (): void => latest.current(element.clientWidth);
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    measure();
    return () => observer.disconnect();
  }, [host]);
}
