import { Button } from '@blueprintjs/core';
import { PageHeader } from '../../components/page-header';
import { BrowserPreferences } from '../../features/me/components/browser-preferences';
import { ChangePassword } from '../../features/me/components/change-password';
import { OwnPin } from '../../features/me/components/own-pin';
import { OwnRoles } from '../../features/me/components/own-roles';
import { OwnSessions } from '../../features/me/components/own-sessions';
import { usePerson } from '../../lib/session';
import { useTerminalChoice } from '../../lib/terminal-choice';
import { useSignOut } from '../sign-out';
import styles from './columns.module.css';

/** One's own sign-in and how this browser shows things. */
export function MePage() {
  const person = usePerson();
  const { terminal } = useTerminalChoice();
  const signOut = useSignOut();
  const zone = terminal?.zone ?? Intl.DateTimeFormat().resolvedOptions().timeZone;
  return (
    <div className="sp-page">
      <PageHeader title="Me">
        <Button onClick={() => signOut.mutate()}>Sign out</Button>
      </PageHeader>
      <div className={styles.two}>
        <div className={styles.stack}>
          <OwnRoles person={person} />
          <OwnSessions zone={zone} />
        </div>
        <div className={styles.stack}>
          <BrowserPreferences />
          <ChangePassword />
          <OwnPin />
        </div>
      </div>
    </div>
  );
}
