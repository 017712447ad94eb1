import { PRIORITIES } from '@stubpost/shared';
import { PriorityMark } from '../../../components/flags';
import { formatDuration } from '../../../lib/time-display';
import { useNow } from '../../../lib/use-now';
import { type RosterDraft, toldLines } from '../model/roster-draft';
import { CHANNEL_WORDS } from './duty-words';
import styles from './duty.module.css';

const afterWords = (seconds: number): string =>
  seconds === 0 ? 'at once' : `after ${formatDuration(seconds)}`;

/** Who would be told of an alert raised now that nobody takes: the rule itself, run on the roster as it stands here. */
export function ToldNow({ draft, zone }: { draft: RosterDraft; zone: string }) {
  const now = useNow(30);
  return (
    <section className="sp-panel" aria-labelledby="told-now">
      <header>
        <h2 id="told-now">Raised now and not taken</h2>
      </header>
      {PRIORITIES.map((priority) => {
        const lines = toldLines(draft, zone, priority, now);
        return (
          <div key={priority} className={styles.told}>
            <PriorityMark priority={priority} />
            {lines.length === 0 ? (
              <p>stands on the board; nobody is written to</p>
            ) : (
              <ol>
                {lines.map(({ afterSeconds, name, channels }) => (
                  <li key={`${afterSeconds} ${name}`}>
                    <span className={styles.after}>{afterWords(afterSeconds)}</span>
                    <span>
                      <b>{name}</b>, by {channels.map((channel) => CHANNEL_WORDS[channel]).join(' and ')}
                    </span>
                  </li>
                ))}
              </ol>
            )}
          </div>
        );
      })}
      <footer>
        Taking an alert, or setting it aside, ends the climb. A text message to somebody without a telephone
        goes out as a mail.
      </footer>
    </section>
  );
}
