import { Navigate } from 'react-router-dom';
import { LoadingRows } from '../../../components/page-states';
import { turnAtHand } from '../model/my-turns';
import { useMyTurns } from './use-my-turns';

/** `/my/turn`: leads to the turn that is at hand, and to all turns where there is none. */
export function TurnAtHand() {
  const { turns, isLoading } = useMyTurns();
  const hand = turnAtHand(turns.mine);
  if (hand !== null) return <Navigate replace to={`/my/turn/${encodeURIComponent(hand.id)}`} />;
  if (isLoading) return <LoadingRows what="your turn" rows={5} rowHeight={72} />;
  return <Navigate replace to="/my" />;
}
