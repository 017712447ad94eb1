import type { WireReading } from '@stubpost/shared';
import { barWords } from '../model/act-words';
import type { ControlsBar } from '../model/controls';
import type { EntryDraft } from '../model/entry-draft';
import { actKey, actLabel, type NextAct } from '../model/next-act';
import type { ActWays } from './act-ways';
import { lockWord } from './lock-notice';
import { RecordBar, ShutBar } from './record-bar';
import { useTurnScene } from './turn-context';
import type { ActOnPage } from './use-act';

/** What an act becomes in the log. */
export function draftOf(act: NextAct, reading: WireReading | undefined): EntryDraft | null {
  switch (act.kind) {
    case 'arrival':
    case 'departure':
      return { kind: act.kind };
    case 'step':
      return { kind: 'step-done', step: act.step.key, ...(reading === undefined ? {} : { reading }) };
    case 'nothing':
      return null;
  }
}

interface ActBarProps {
  page: ActOnPage;
  bar: ControlsBar | null;
  isPicked: boolean;
  ways: ActWays;
}

/** The bar of an act: shut with its reason, open with its name. */
export function ActBar({ page, bar, isPicked, ways }: ActBarProps) {
  const { turn } = useTurnScene();
  const { act, lock, reading, earlier, brakes } = page;
  const label = actLabel(act);
  if (bar !== null) {
    return (
      <ShutBar
        under={bar.kind === 'at-controls' ? 'until the next arrival' : 'the conductor or the desk records it'}
      >
        No bar here
      </ShutBar>
    );
  }
  const draft = draftOf(act, reading);
  if (draft === null)
    return (
      <ShutBar under={turn.annulled === null ? 'every step is recorded' : 'this turn does not run'}>
        Nothing open
      </ShutBar>
    );
  if (lock?.kind === 'briefing' && !page.isLockLifted) return <BriefingBar ways={ways} />;
  if (lock !== null && !page.isLockLifted) return <ShutBar under={lockWord(lock)}>{label}</ShutBar>;
  if (page.waitsFor !== null) return <ShutBar under={page.waitsFor}>{label}</ShutBar>;
  const words = barWords(label, brakes.hand, reading);
  const touch = (): void =>
    brakes.hand === 'released' ? ways.onGo({ kind: 'second', page }) : ways.onRecord(draft, words, earlier);
  const isOwn = isPicked || page.isLockLifted || page.fields.length > 0 || page.asksTime;
  return (
    <RecordBar
      barKey={actKey(act)}
      isOwnChange={isOwn}
      over={earlier === null ? 'Record now' : 'Record for earlier'}
      onRecord={touch}
    >
      {words}
    </RecordBar>
  );
}

/** The safety briefing with everybody's agreement, recorded in one touch before the step it comes before. */
function BriefingBar({ ways }: { ways: ActWays }) {
  return (
    <RecordBar
      barKey="briefing"
      over="Record first"
      onRecord={() => ways.onRecord({ kind: 'briefing' }, 'Safety briefing, all agreed', null)}
    >
      Briefing, all agreed
    </RecordBar>
  );
}
