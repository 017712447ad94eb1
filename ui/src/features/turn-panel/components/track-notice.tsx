import type { WireTrack } from '@stubpost/shared';
import { useQueryClient } from '@tanstack/react-query';
import type { WireBoard } from '@stubpost/shared';
import { queryKeys } from '../../../lib/query-keys';
import type { TurnNow } from '../../../lib/turn/turn-now';
import { trackWords } from '../model/track-words';
import styles from './entry-dialog.module.css';

/** What a move would mean, before it is made: length, stopping marker, trains that are there. */
export function TrackNotice({
  turn,
  to,
  tracks,
}: {
  turn: TurnNow;
  to: string;
  tracks: readonly WireTrack[];
}) {
  const client = useQueryClient();
  if (to === '' || to === turn.track) return null;
  const boards = client.getQueriesData<WireBoard>({ queryKey: queryKeys.turns.boards });
  const others = boards.flatMap(([, board]) => board?.turns ?? []);
  const words = trackWords(turn, to, tracks, others);
  return (
    <ul className={styles.notice} aria-live="polite">
      {words.map((line) => (
        <li key={line}>{line}</li>
      ))}
    </ul>
  );
}
