import { useEffect } from 'react';
import { useParams } from 'react-router-dom';
import { TurnScreen } from '../../features/my-turn/components/turn-screen';

/** One turn on the phone. */
export function MyTurnPage() {
  const { turnId = '' } = useParams();
  useEffect(() => {
    document.title = 'Turn · Stubpost';
  }, []);
  return <TurnScreen key={turnId} turnId={turnId} />;
}
