import { useEffect } from 'react';
import { TurnAtHand } from '../../features/my-turn/components/turn-at-hand';

/** The way to the turn of a crew that is at hand. */
export function TurnAtHandPage() {
  useEffect(() => {
    document.title = 'Turn · Stubpost';
  }, []);
  return <TurnAtHand />;
}
