import type { ReactNode } from 'react';
import { StepMark } from '../../../components/step-mark';
import { formatRelative, formatTime, toInstant } from '../../../lib/time-display';
import { doerLine } from '../model/act-words';
import { actLabel, type NextAct } from '../model/next-act';
import styles from './phone-parts.module.css';
import { useTurnScene } from './turn-context';
import { nextHeadingId } from './use-places';

export interface NextStepProps {
  act: NextAct;
  /** Words above the name: "Next step", "After this". */
  lead: string;
  /** What stands below the hint: cars, number pad, a button. */
  children?: ReactNode;
  /** Instead of who makes the step and who records it. */
  hint?: string;
  /** Leaves out the long wording, where the page needs the room. */
  isBrief?: boolean;
}

/** The one next thing: its mark, its name, by when. */
export function NextStep({ act, lead, children, hint, isBrief = false }: NextStepProps) {
  const { steps, me, turn } = useTurnScene();
  const planned = act.kind === 'step' ? steps.find((step) => step.key === act.step.key) : undefined;
  const fullLabel = act.kind === 'step' && act.step.label !== act.step.shortLabel ? act.step.label : null;
  const words =
    hint ?? (planned === undefined ? movementHint(act, turn.outbound?.train) : doerLine(planned, me.role));
  return (
    <section className={styles.next} aria-label={lead}>
      <p className="muted">{lead}</p>
      <h2 className={styles.lead} id={nextHeadingId} tabIndex={-1}>
        {act.kind === 'step' && <StepMark kind={act.step.kind} state="due" size={30} />}
        {act.kind === 'arrival' || act.kind === 'departure' ? (
          <StepMark kind="movement" state="due" size={30} />
        ) : null}
        {actLabel(act)}
      </h2>
      <DueWords act={act} />
      {fullLabel !== null && !isBrief && <p>{fullLabel}.</p>}
      {words !== '' && <p>{words}</p>}
      {children}
    </section>
  );
}

function movementHint(act: NextAct, train: string | undefined): string {
  if (act.kind === 'arrival')
    return 'Record it when the train stands. Only where your rules let you use the phone then.';
  if (act.kind === 'departure')
    return `Record it when ${train ?? 'the train'} leaves, only where your rules let you. The desk can write it too.`;
  return '';
}

function DueWords({ act }: { act: NextAct }) {
  const { turn, now } = useTurnScene();
  const due = dueOf(act, turn);
  if (due === null) return null;
  const at = toInstant(due);
  const isPast = at < now;
  return (
    <p className={styles.due}>
      {isPast ? 'was due ' : 'by '}
      <b>{formatTime(at, turn.zone)}</b>, {formatRelative(at, now)}
    </p>
  );
}

function dueOf(act: NextAct, turn: ReturnType<typeof useTurnScene>['turn']): string | null {
  switch (act.kind) {
    case 'arrival':
      return turn.inbound?.expectedArrivalAt ?? turn.inbound?.scheduledArrivalAt ?? null;
    case 'departure':
      return turn.outbound?.heldUntil ?? turn.outbound?.scheduledDepartureAt ?? null;
    case 'step':
      return act.step.dueAt;
    case 'nothing':
      return null;
  }
}
