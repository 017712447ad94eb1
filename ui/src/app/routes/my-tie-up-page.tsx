import { useEffect } from 'react';
import { useSearchParams } from 'react-router-dom';
import { TieUpScreen } from '../../features/my-turn/components/tie-up-screen';

/** Leaving a set; `?turn=` says which, without it the page asks. */
export function MyTieUpPage() {
  const [search] = useSearchParams();
  const turnId = search.get('turn');
  useEffect(() => {
    document.title = 'Tie-up · Stubpost';
  }, []);
  return <TieUpScreen key={turnId ?? ''} turnId={turnId} />;
}
