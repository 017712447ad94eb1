import type { ReactNode } from 'react';
import { tieUpReasons } from '../model/reasons';
import { leftHandbrakes, leftWords, securementGaps, tieUpWaitsFor, type TieUpForm } from '../model/tie-up';
import type { ActWays } from './act-ways';
import { Foot } from './foot';
import styles from './phone-parts.module.css';
import { ReasonField } from './reason-field';
import { RecordBar, ShutBar } from './record-bar';
import { TieUpAir, TieUpChecks, TieUpDefects, TieUpHead } from './tie-up-parts';
import { TieUpHandbrakes } from './tie-up-handbrakes';
import { Caution } from '../../../components/caution';
import { useTurnScene } from './turn-context';
import { UnsentNotice } from './unsent-notice';
import type { useReason } from './use-reason';

interface TieUpPlaceProps {
  ways: ActWays;
  doneBar: ReactNode;
  form: TieUpForm;
  onForm: (form: TieUpForm) => void;
  reasoned: ReturnType<typeof useReason>;
}

/** What a set is left with: handbrakes by car, lights and doors, what is bad, its air. Open securement asks for a reason. */
export function TieUpPlace({ ways, doneBar, form, onForm, reasoned }: TieUpPlaceProps) {
  const { turn, steps } = useTurnScene();
  const { reason, field } = reasoned;
  const gaps = securementGaps(turn, steps, form);
  return (
    <>
      <div className={styles.main}>
        <TieUpHead />
        <UnsentNotice />
        <TieUpHandbrakes form={form} onForm={onForm} />
        {gaps.length > 0 && <OpenSecurement gaps={gaps} />}
        {gaps.length > 0 && <ReasonField reasons={tieUpReasons} {...field} />}
        <TieUpChecks form={form} onForm={onForm} />
        <TieUpDefects onDefect={() => ways.onGo({ kind: 'defect' })} />
        <TieUpAir form={form} onForm={onForm} />
        <Caution>
          Records how you left the set. Whether it stands secured is decided by your rules, the law in force
          and qualified people.
        </Caution>
      </div>
      <Foot>{doneBar ?? <TieUpBar form={form} gaps={gaps} reason={reason} ways={ways} />}</Foot>
    </>
  );
}

/** What is open about the securement; it stands by the handbrakes, and with it the place for the reason. */
function OpenSecurement({ gaps }: { gaps: readonly string[] }) {
  return (
    <section className={styles.refused} aria-labelledby="tie-up-open" role="status">
      <h2 id="tie-up-open">Securement is open</h2>
      {gaps.map((gap) => (
        <p key={gap}>{gap}</p>
      ))}
      <p>The set is tied up with a reason only.</p>
    </section>
  );
}

function TieUpBar({
  form,
  gaps,
  reason,
  ways,
}: {
  form: TieUpForm;
  gaps: readonly string[];
  reason: string;
  ways: ActWays;
}) {
  const { turn } = useTurnScene();
  const name = turn.set === null ? 'the set' : `set ${turn.set}`;
  const waits = tieUpWaitsFor(form, gaps, reason);
  const handbrakes = leftHandbrakes(form);
  if (waits !== null || handbrakes === null)
    return <ShutBar under={waits ?? 'waits for the handbrakes'}>Tie up {name}</ShutBar>;
  const record = (): void =>
    ways.onRecord(
      {
        kind: 'tied-up',
        handbrakes,
        checks: [...form.checks],
        offAir: form.offAir === true,
        ...(gaps.length > 0 ? { reason } : {}),
      },
      `Tied up ${name}, ${leftWords(handbrakes)}`,
      null,
    );
  return (
    <RecordBar barKey="tie-up" isOwnChange over="Record now" under={leftWords(handbrakes)} onRecord={record}>
      {gaps.length > 0 ? `Tied up with a reason` : `Tied up: ${name}`}
    </RecordBar>
  );
}
