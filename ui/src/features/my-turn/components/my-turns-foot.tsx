import type { WireTurn } from '@stubpost/shared';
import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { stepsFor } from '@stubpost/shared';
import { formatTimeAndRelative, toInstant } from '../../../lib/time-display';
import { useNow } from '../../../lib/use-now';
import { planQuery } from '../api/turn-queries';
import type { OutboxState } from '../../../lib/outbox/outbox';
import { actLabel, nextAct } from '../model/next-act';
import styles from './phone-foot.module.css';
import { sentState } from '../model/sent-state';
import { SentStrip } from './sent-strip';

/** The foot of `/my`: opens the turn at hand and names its next step, and under it where the entries are. */
export function MyTurnsFoot({
  hand,
  state,
  zone,
}: {
  hand: WireTurn | null;
  state: OutboxState;
  zone: string;
}) {
  return (
    <div className={styles.foot}>
      {hand !== null && <OpenTurn turn={hand} />}
      <SentStrip state={sentState(state, null)} zone={zone} />
    </div>
  );
}

function OpenTurn({ turn }: { turn: WireTurn }) {
  const now = useNow();
  const { data: plan } = useQuery(planQuery(turn.planId));
  const act = plan === undefined ? null : nextAct(turn, stepsFor(plan.steps, turn));
  const due = act?.kind === 'step' ? act.step.dueAt : null;
  const when =
    due === null
      ? null
      : `${toInstant(due) < now ? 'was due' : 'by'} ${formatTimeAndRelative(due, turn.zone, now)}`;
  return (
    <Link className={styles.bar} to={`/my/turn/${turn.id}`}>
      <span>Open train {turn.outbound?.train ?? turn.inbound?.train}</span>
      <b>{act === null ? 'Turn' : actLabel(act)}</b>
      {when !== null && <span>{when}</span>}
    </Link>
  );
}
