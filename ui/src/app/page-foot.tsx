import type { WireTerminal } from '@stubpost/shared';
import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { healthQuery } from '../lib/service-facts';
import { OtherZone } from './other-zone';
import styles from './shell.module.css';

/** Help in the same place on every page, and whose clock the page goes by. */
export function PageFoot({ terminal = null }: { terminal?: WireTerminal | null }) {
  const { data } = useQuery(healthQuery);
  return (
    <footer className={styles.foot}>
      <Link to="/help">Help</Link>
      <Link to="/keys">Keys</Link>
      <Link to="/accessibility">Accessibility</Link>
      {terminal !== null && <OtherZone terminal={terminal} />}
      {data !== undefined && <span className={styles.version}>Version {data.version}</span>}
    </footer>
  );
}
