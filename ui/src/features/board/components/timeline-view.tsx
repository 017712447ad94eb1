import { millisecondsInMinute } from '@stubpost/shared';
import { replaceEqualDeep } from '@tanstack/react-query';
import { lazy, Suspense, useMemo, useRef, useState } from 'react';
import { LoadingRows } from '../../../components/page-states';
import { formatServiceDate, formatZoneLetters } from '../../../lib/time-display';
import { groupRows, type BoardRow } from '../model/group-rows';
import { rowHead } from '../model/head-lines';
import { detailedItems } from '../model/picture-items';
import { stepWords } from '../../../lib/turn/step-words';
import { clockText, timeText } from '../../../lib/turn/time-text';
import { draggedChoice, summaryFromMinutes, type WindowChoice } from '../model/time-window';
import type { BoardPartProps } from './board-part';
import styles from './board.module.css';
import { RowHeads } from './row-heads';
import { useTurnList, type TurnList } from './use-turn-list';

const TimelinePicture = lazy(() =>
  import('./timeline-picture').then((loaded) => ({ default: loaded.TimelinePicture })),
);

const usualWidth = 1104;

/** Row heads in words and, beside them, the picture. */
export function TimelineView(props: BoardPartProps & { onDrag: (choice: WindowChoice) => void }) {
  const { terminal, view, now, found } = props;
  const { zone } = terminal;
  const [width, setWidth] = useState(usualWidth);
  const subject = view.by === 'set' ? 'set' : 'track';
  const rows = groupRows(found.shown, subject, terminal.tracks, now);
  const minutes = (found.window.to - found.window.from) / millisecondsInMinute;
  const pixelsPerMinute = Math.max(width, 1) / minutes;
  const scene = {
    rows,
    window: found.window,
    now,
    pixelsPerMinute,
    clock: (instant: number) => timeText(instant, zone),
  };
  const items = detailedItems(scene, minutes >= summaryFromMinutes);
  const caption =
    `Turns by ${subject}, ${terminal.name}, ${formatServiceDate(found.date)}, ` +
    `${timeText(found.window.from, zone)} to ${timeText(found.window.to, zone)} ${formatZoneLetters(now, zone)}`;
  const heads = useHeads(rows, props);
  const list = useTurnList({
    ids: heads.flatMap((head) => head.lines.map((line) => line.id)),
    stepsOf: (turnId) => found.all.get(turnId)?.steps.map((step) => step.key) ?? [],
    onAct: props.onAct,
    onWindow: props.onWindow,
    openId: props.openId,
  });
  const isNowShown = now >= found.window.from && now < found.window.to;
  return (
    <div className={styles.rows} {...found.steady.hold} onScroll={setScrolled}>
      <RowHeads
        caption={caption}
        subject={subject}
        heads={heads}
        wordsOf={props.wordsOf}
        stepWords={useStepWords(props, list)}
        list={list}
        openId={props.openId}
        onAct={props.onAct}
      />
      <Suspense fallback={<LoadingRows what="the picture" rows={rows.length} rowHeight={72} />}>
        <TimelinePicture
          rowIds={rows.map((row) => row.id)}
          items={items}
          window={found.window}
          now={now}
          zone={zone}
          clock={isNowShown ? clockText(now, zone).slice(0, 8) : null}
          pixelsPerMinute={pixelsPerMinute}
          onWidth={setWidth}
          onDrag={(window) => props.onDrag(draggedChoice(window))}
          onPick={(turnId) => props.onAct('open', turnId, null)}
        />
      </Suspense>
    </div>
  );
}

/** The axis of the picture is part of the scrolled content; this keeps it at the top edge. */
function setScrolled(event: React.UIEvent<HTMLDivElement>): void {
  const area = event.currentTarget;
  area.style.setProperty('--scrolled', `${area.scrollTop}px`);
}

function useHeads(rows: readonly BoardRow[], { found, now, terminal }: BoardPartProps) {
  const kept = useRef<ReturnType<typeof rowHead>[]>([]);
  const heads = rows.map((row) =>
    rowHead(row, {
      now,
      zone: terminal.zone,
      windowTo: found.window.to,
      tracks: terminal.tracks,
      trainOf: (id) => found.all.get(id)?.train ?? '',
    }),
  );
  kept.current = replaceEqualDeep(kept.current, heads);
  return kept.current;
}

function useStepWords({ found, terminal }: BoardPartProps, list: TurnList): string | null {
  const turn = list.activeId === null ? undefined : found.all.get(list.activeId);
  const step = turn?.steps.find((one) => one.key === list.activeStep);
  return useMemo(
    () => (step === undefined ? null : capitalised(stepWords(step, terminal.zone))),
    [step, terminal.zone],
  );
}

const capitalised = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);
