import type { Permission, WireTerminal } from '@stubpost/shared';
import { may } from '@stubpost/shared';
import { Link, useSearchParams } from 'react-router-dom';
import { PageHeader } from '../../../components/page-header';
import { ErrorState, LoadingRows } from '../../../components/page-states';
import { PartBoundary } from '../../../components/part-boundary';
import { usePerson } from '../../../lib/session';
import { useTerminalChoice } from '../../../lib/terminal-choice';
import { PlanPart } from './plan-part';
import { SetPart } from './set-part';
import styles from './setup.module.css';
import { ThresholdPart } from './threshold-part';
import { TrackPart } from './track-part';

type PartKey = 'plans' | 'thresholds' | 'tracks' | 'sets';

interface Part {
  key: PartKey;
  name: string;
  permission: Permission;
  /** The part is about the chosen terminal, and the right is asked for there. */
  isOfTerminal: boolean;
}

/** Parts of the page, each for those who may change it; step plans can be read by everybody. */
const parts: readonly Part[] = [
  { key: 'plans', name: 'Step plans', permission: 'plans.read', isOfTerminal: true },
  { key: 'thresholds', name: 'Thresholds', permission: 'settings.edit', isOfTerminal: true },
  { key: 'tracks', name: 'Terminals and tracks', permission: 'terminals.manage', isOfTerminal: false },
  { key: 'sets', name: 'Sets', permission: 'sets.edit', isOfTerminal: false },
];

/** `/setup`: what a terminal and its trains are made of. The part stands in the address. */
export function SetupScreen() {
  const person = usePerson();
  const { terminal, isPending, error } = useTerminalChoice();
  const [search] = useSearchParams();
  const open = parts.filter(({ permission, isOfTerminal }) =>
    may(person, permission, isOfTerminal ? terminal?.code : undefined),
  );
  const shown = open.find(({ key }) => key === search.get('part')) ?? open[0];
  const to = (key: PartKey): string => {
    const next = new URLSearchParams(search);
    next.set('part', key);
    return `?${next.toString()}`;
  };
  return (
    <div className="sp-page">
      <PageHeader title="Set-up">
        <nav aria-label="Parts of the set-up">
          <ul className={styles.parts}>
            {open.map(({ key, name }) => (
              <li key={key}>
                <Link to={to(key)} aria-current={key === shown?.key ? 'page' : undefined}>
                  {name}
                </Link>
              </li>
            ))}
          </ul>
        </nav>
      </PageHeader>
      {isPending && <LoadingRows what="terminals" />}
      {error !== null && <ErrorState error={error} />}
      {!isPending && error === null && shown !== undefined && (
        <PartBoundary
          key={`${shown.key} ${terminal?.code ?? ''}`}
          part="This part"
          rest="Nothing was changed."
        >
          <ShownPart part={shown} terminal={terminal} />
        </PartBoundary>
      )}
    </div>
  );
}

function ShownPart({ part, terminal }: { part: Part; terminal: WireTerminal | null }) {
  if (part.key === 'sets') return <SetPart />;
  if (part.key === 'tracks') return <TrackPart terminal={terminal} />;
  if (terminal === null) return <p>No terminal yet. The administrator adds one or imports a timetable.</p>;
  return part.key === 'plans' ? <PlanPart terminal={terminal} /> : <ThresholdPart terminal={terminal} />;
}
