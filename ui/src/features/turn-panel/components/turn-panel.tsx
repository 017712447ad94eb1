import { Button } from '@blueprintjs/core';
import { mayRecord, type EntryKind, type WireTerminal } from '@stubpost/shared';
import { useQuery } from '@tanstack/react-query';
import { useEffect, useId, useRef, type KeyboardEvent, type ReactNode } from 'react';
import { SafetyCaution } from '../../../components/caution';
import { ErrorState, LoadingRows } from '../../../components/page-states';
import { usePreferences } from '../../../lib/preferences';
import { usePerson } from '../../../lib/session';
import type { TurnNow } from '../../../lib/turn/turn-now';
import { shownSlack } from '../../../lib/turn/turn-times';
import { planQuery } from '../../../lib/turn/turn-queries';
import { useTurnAt } from '../../../lib/turn/use-turn-at';
import { isTyping, usePageKey } from '../../../lib/use-key';
import { useNow } from '../../../lib/use-now';
import { actsOf, type ActTarget, type EntryAct } from '../model/entry-acts';
import { isOutsideQuestions } from '../model/question-words';
import { squeezeOf, squeezeWords } from '../model/squeeze';
import { EntryLog } from './entry-log';
import { PanelHead } from './panel-head';
import { SqueezePicture } from './squeeze-picture';
import { StandPicture } from './stand-picture';
import { QuestionBlock } from './question-block';
import { Reported } from './reported';
import { StepsTable, type EntryToChange } from './steps-table';
import { ForecastWords, TurnFacts } from './turn-facts';
import styles from './turn-panel.module.css';
import type { Recorded } from './use-entry-form';

export interface TurnPanelProps {
  turnId: string;
  terminal: WireTerminal;
  /** Stands alone instead of over the board. */
  isPage: boolean;
  /** Standing alerts of the turn, as another part of the page draws them. */
  alerts?: (turn: TurnNow) => ReactNode;
  onAct: (target: ActTarget) => void;
  /** A ruling was recorded. */
  onRecorded: (recorded: Recorded) => void;
  onFullPage: () => void;
  onClose: () => void;
}

/** One turn: how it stands, its squeeze, its steps, everything that can be entered about it, and its log. */
export function TurnPanel(props: TurnPanelProps) {
  const { turnId, isPage, onClose } = props;
  const titleId = useId();
  const panel = useRef<HTMLElement>(null);
  const { turn, error, refetch } = useTurnAt(turnId);
  const isThere = turn !== undefined;
  useEffect(() => {
    if (isThere) document.getElementById(titleId)?.focus({ preventScroll: true });
  }, [isThere, turnId, titleId]);
  const keys = usePanelKeys(props, turn);
  return (
    <section
      ref={panel}
      className={isPage ? styles.page : styles.panel}
      aria-labelledby={isThere ? titleId : undefined}
      aria-label={isThere ? undefined : 'Turn'}
      {...(isPage ? {} : { role: 'dialog', 'aria-modal': false })}
      onKeyDown={keys}
    >
      {turn === undefined && (
        <div className={styles.head}>
          {error === null ? (
            <LoadingRows what="the turn" rows={8} />
          ) : (
            <ErrorState error={error} onRetry={refetch} />
          )}
          <Button onClick={onClose}>Close</Button>
        </div>
      )}
      {turn !== undefined && <PanelBody {...props} turn={turn} titleId={titleId} />}
    </section>
  );
}

const letterActs: Record<string, EntryAct> = { r: 'step', n: 'note', m: 'track', w: 'set' };

/** Esc closes, wherever the focus is; the letters of the list work here too, while nobody types. */
function usePanelKeys({ turnId, terminal, onAct, onClose }: TurnPanelProps, turn: TurnNow | undefined) {
  const { letterKeys } = usePreferences();
  usePageKey({ key: 'escape' }, onClose);
  const acts = actsOf(usePerson(), terminal.code);
  return (event: KeyboardEvent): void => {
    if (event.defaultPrevented || event.ctrlKey || event.altKey || event.metaKey) return;
    const act = letterActs[event.key.toLowerCase()];
    if (act === undefined || !letterKeys || turn === undefined || !acts.has(act) || isTyping(event.target))
      return;
    event.preventDefault();
    onAct({ act, turnId });
  };
}

function PanelBody(props: TurnPanelProps & { turn: TurnNow; titleId: string }) {
  const { turn, terminal, isPage } = props;
  const now = useNow();
  const person = usePerson();
  const acts = actsOf(person, terminal.code);
  const may = (kind: EntryKind): boolean => mayRecord(person, kind, terminal.code);
  const { data: plan } = useQuery(planQuery(turn.planId));
  const typicalOf = (key: string): number =>
    plan?.steps.find((step) => step.key === key)?.typicalSeconds ?? 0;
  const squeeze = plan === undefined ? null : squeezeOf(turn, typicalOf, now);
  const open = (act: EntryAct, rest: Partial<ActTarget> = {}): void =>
    props.onAct({ act, turnId: turn.id, ...rest });
  const takeBack = (entry: EntryToChange, act: 'withdrawn' | 'corrected'): void =>
    open(act, {
      entryId: entry.entryId,
      entryWords: entry.words,
      entryAt: entry.at,
      entryReading: entry.reading,
    });
  const mayChange = acts.has('withdrawn') && acts.has('corrected');
  return (
    <>
      <PanelHead
        turn={turn}
        now={now}
        titleId={props.titleId}
        onFullPage={isPage ? undefined : props.onFullPage}
        onClose={props.onClose}
      />
      {props.alerts?.(turn)}
      <QuestionBlock turn={turn} mayRule={may('ruled')} onRecorded={props.onRecorded} />
      <div className={styles.body}>
        <div className={styles.left}>
          {squeeze !== null && (
            <section aria-label="Squeeze">
              <h3 className={styles.heading}>
                Squeeze{' '}
                <span className={styles.plain}>{squeezeWords(shownSlack(turn) ?? squeeze.spareSeconds)}</span>
              </h3>
              <SqueezePicture squeeze={squeeze} now={now} zone={turn.zone} />
            </section>
          )}
          <section aria-label="Steps">
            <h3 className={styles.heading}>
              Steps
              <span className={styles.headingActs}>
                {acts.has('step') && turn.steps.length > 0 && turn.annulled === null && (
                  <Button size="small" aria-keyshortcuts="R" onClick={() => open('step')}>
                    Relay by radio
                  </Button>
                )}
                {acts.has('note') && (
                  <Button size="small" aria-keyshortcuts="N" onClick={() => open('note')}>
                    Note
                  </Button>
                )}
              </span>
            </h3>
            {turn.steps.length === 0 ? (
              <p className="muted">This train does not reverse here: it has no steps.</p>
            ) : (
              <StepsTable
                turn={turn}
                onRelay={acts.has('step') ? (step) => open('step', { step }) : undefined}
                onTakeBack={
                  mayChange
                    ? (entry) => takeBack(entry, turn.departedAt === null ? 'withdrawn' : 'corrected')
                    : undefined
                }
              />
            )}
          </section>
          <EntryLog turn={turn} onTakeBack={mayChange ? takeBack : undefined} />
        </div>
        <div className={styles.right}>
          <ForecastWords turn={turn} now={now} />
          <TurnFacts turn={turn} now={now} acts={acts} onAct={open} />
          <Reported turn={turn} />
          <Findings findings={turn.findings.filter(isOutsideQuestions)} />
        </div>
      </div>
      <footer className={styles.foot}>
        <StandPicture turn={turn} track={terminal.tracks.find((track) => track.label === turn.track)} />
        <div className={styles.caution}>
          <SafetyCaution />
        </div>
      </footer>
    </>
  );
}

/** What is wrong with the entries, in words. Nothing where nothing is. */
function Findings({ findings }: { findings: readonly string[] }) {
  if (findings.length === 0) return null;
  return (
    <section aria-label="To look at">
      <h3 className={styles.heading}>To look at</h3>
      <ul className={styles.findings}>
        {findings.map((finding) => (
          <li key={finding}>{finding}</li>
        ))}
      </ul>
    </section>
  );
}
