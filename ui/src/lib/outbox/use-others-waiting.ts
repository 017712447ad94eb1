import { useEffect, useState } from 'react';
import { useSession } from '../session';
import { createOutboxStore } from './outbox-store';

/** How many entries of other people wait on this phone. A plain count: nobody is shown what is in them. */
export function useOthersWaiting(): number {
  const { person } = useSession();
  const personId = person?.id ?? null;
  const [count, setCount] = useState(0);
  useEffect(() => {
    let isGone = false;
    void createOutboxStore()
      .countOthers(personId)
      .then((others) => {
        if (!isGone) setCount(others);
      })
      .catch(() => undefined);
    return () => {
      isGone = true;
    };
  }, [personId]);
  return count;
}
