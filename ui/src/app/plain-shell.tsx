import type { ReactNode } from 'react';
import { Outlet } from 'react-router-dom';
import { Clock, Today } from '../components/clock';
import { PostMark } from '../components/post-mark';
import { DemoLabel } from './demo-label';
import { NewerVersion } from './newer-version';
import { NotEncrypted } from './not-encrypted';
import { PageFoot } from './page-foot';
import styles from './shell.module.css';

const ownZone = Intl.DateTimeFormat().resolvedOptions().timeZone;

/** Bars of the pages that need nobody signed in. The clock is the device's, since no terminal is chosen yet. */
export function PlainShell({ children }: { children?: ReactNode }) {
  return (
    <div className={styles.desk}>
      <NotEncrypted />
      <NewerVersion />
      <header className={styles.topbar}>
        <a className={styles.brand} href="/">
          <PostMark />
          Stubpost
        </a>
        <DemoLabel short />
        <div className={styles.plainClock}>
          <Today zone={ownZone} /> <Clock zone={ownZone} />
        </div>
      </header>
      <main className={styles.main} id="page">
        {children ?? <Outlet />}
      </main>
      <PageFoot />
    </div>
  );
}
