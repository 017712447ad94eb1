import { useQuery } from '@tanstack/react-query';
import { demoQuery } from '../lib/service-facts';
import styles from './shell.module.css';

/** Says on every page of a demo that it is one. */
export function DemoLabel({ short = false }: { short?: boolean }) {
  const { data } = useQuery(demoQuery);
  if (data?.demo !== true) return null;
  if (short) return <span className={styles.demo}>Demo</span>;
  const filling = data.state === 'filling' ? `. ${data.message ?? 'History is being filled in'}` : '';
  return <span className={styles.demo}>Demo: railroad, people and times are invented{filling}</span>;
}
