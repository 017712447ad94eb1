import { useQuery } from '@tanstack/react-query';
import { useEffect } from 'react';
import { announce } from '../lib/announcer';
import { sweepQuery } from '../lib/service-facts';
import { formatClock } from '../lib/time-display';
import styles from './shell.module.css';

/** Stands while the alert sweep is silent: the absence of alerts means nothing then. */
export function SweepSilent({ zone }: { zone: string }) {
  const { data } = useQuery(sweepQuery);
  const isSilent = data?.isSilent === true;
  useEffect(() => {
    if (isSilent) announce('No alerts are raised: the alert sweep is silent');
  }, [isSilent]);
  if (data === undefined || !isSilent) return null;
  const since = data.lastSweepAt === null ? 'the server started' : formatClock(data.lastSweepAt, zone);
  return (
    <p className={styles.sweepSilent} role="alert">
      <b>No alerts are raised.</b> There was no alert sweep since {since}. Watch the turns by radio and the
      timetable; have somebody look at the server.
    </p>
  );
}
