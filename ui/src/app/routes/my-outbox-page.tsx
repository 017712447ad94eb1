import { useEffect } from 'react';
import { OutboxScreen } from '../../features/my-turn/components/outbox-screen';

/** What is on this phone and where it is. */
export function MyOutboxPage() {
  useEffect(() => {
    document.title = 'Outbox · Stubpost';
  }, []);
  return <OutboxScreen />;
}
