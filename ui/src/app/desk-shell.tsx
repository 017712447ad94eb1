import { useState } from 'react';
import { Outlet, useLocation, useNavigate } from 'react-router-dom';
import { PartBoundary } from '../components/part-boundary';
import { FindDialog } from '../features/find/components/find-dialog';
import { LiveProvider } from '../lib/live';
import { usePreferences } from '../lib/preferences';
import { useTerminalChoice } from '../lib/terminal-choice';
import { usePageKey } from '../lib/use-key';
import { LiveAnnouncer } from './live-announcer';
import { NewerVersion } from './newer-version';
import { NotEncrypted } from './not-encrypted';
import { PageFoot } from './page-foot';
import { PageNames } from './page-names';
import { SweepSilent } from './sweep-silent';
import { TopBar } from './top-bar';
import styles from './shell.module.css';

const ownZone = Intl.DateTimeFormat().resolvedOptions().timeZone;

/** A board and the panel of a turn over it are one page: opening a turn must not draw the board anew. */
const pageOf = (pathname: string): string => (/^\/(board|turns)\//.test(pathname) ? '/board' : pathname);

/** Bars of the desk: one stream, one terminal, one place for everything that stands on every page. */
export function DeskShell() {
  const { terminal, terminals } = useTerminalChoice();
  const { pathname } = useLocation();
  const navigate = useNavigate();
  const { letterKeys } = usePreferences();
  const [isFinding, setFinding] = useState(false);
  const zone = terminal?.zone ?? ownZone;
  usePageKey({ key: 'k', withControl: true, isOff: terminal === null }, () => setFinding(true));
  usePageKey({ key: '?', isOff: !letterKeys }, () => void navigate('/keys'));

  return (
    <LiveProvider terminal={terminal?.code ?? null}>
      <div className={styles.desk}>
        <a className="skip" href="#page">
          To the page
        </a>
        <NotEncrypted />
        <NewerVersion />
        <SweepSilent zone={zone} />
        <header>
          <TopBar terminal={terminal} terminals={terminals} zone={zone} onFind={() => setFinding(true)} />
          <PageNames zone={zone} path={pathname} />
        </header>
        <main className={styles.main} id="page" tabIndex={-1}>
          <PartBoundary key={pageOf(pathname)} part="This page" rest="The other pages are fine.">
            <Outlet />
          </PartBoundary>
        </main>
        <PageFoot terminal={terminal} />
      </div>
      {terminal !== null && (
        <FindDialog terminal={terminal.code} isOpen={isFinding} onClose={() => setFinding(false)} />
      )}
      <LiveAnnouncer zone={zone} />
    </LiveProvider>
  );
}
