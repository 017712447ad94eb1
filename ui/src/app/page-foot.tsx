import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { healthQuery } from '../lib/service-facts';
import styles from './shell.module.css';

/** Help in the same place on every page. */
export function PageFoot() {
  const { data } = useQuery(healthQuery);
  return (
    <footer className={styles.foot}>
      <Link to="/help">Help</Link>
      <Link to="/keys">Keys</Link>
      <Link to="/accessibility">Accessibility</Link>
      {data !== undefined && <span className={styles.version}>Version {data.version}</span>}
    </footer>
  );
}
