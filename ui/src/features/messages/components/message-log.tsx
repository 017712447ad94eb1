import type { WireMessage } from '@stubpost/shared';
import { formatClock, formatStamp } from '../../../lib/time-display';
import { CHANNEL_WORDS, SEND_OUTCOME_WORDS, stateWords } from './message-words';

function Tries({ message, zone }: { message: WireMessage; zone: string }) {
  const { tries } = message;
  if (tries.length === 0) return <>not yet</>;
  return (
    <ul>
      {tries.slice(-3).map(({ at, outcome, detail }, index) => (
        <li key={index}>
          {formatClock(at, zone)} {SEND_OUTCOME_WORDS[outcome]}
          {outcome === 'failed' && `: ${detail}`}
        </li>
      ))}
      {tries.length > 3 && <li className="muted">and {tries.length - 3} before</li>}
    </ul>
  );
}

/** Outgoing messages, the newest first, with what came of each try. */
export function MessageLog({ messages, zone }: { messages: readonly WireMessage[]; zone: string }) {
  if (messages.length === 0) return <p>No message has gone out yet.</p>;
  return (
    <div className="sp-table-scroll" role="region" aria-label="Outgoing messages" tabIndex={0}>
      <table className="sp-table">
        <thead>
          <tr>
            <th scope="col">Written</th>
            <th scope="col">To</th>
            <th scope="col">Subject</th>
            <th scope="col">State</th>
            <th scope="col">Tries</th>
          </tr>
        </thead>
        <tbody>
          {messages.map((message) => (
            <tr key={message.id}>
              <td className="nowrap">{formatStamp(message.createdAt, zone)}</td>
              <th scope="row">
                {message.name}
                <div className="muted small">
                  {CHANNEL_WORDS[message.channel]} {message.to}
                </div>
              </th>
              <td>{message.subject}</td>
              <td className="nowrap">{stateWords(message, zone)}</td>
              <td>
                <Tries message={message} zone={zone} />
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
