import type { CrewRole, SignedInPerson, WireTerminal, WireTurn } from '@stubpost/shared';
import { Link } from 'react-router-dom';
import { Today } from '../../../components/clock';
import { ErrorState, LoadingRows } from '../../../components/page-states';
import { usePerson } from '../../../lib/session';
import { dateAt, formatServiceDate } from '../../../lib/time-display';
import { useNow } from '../../../lib/use-now';
import { useOutbox } from '../../../lib/outbox/use-outbox';
import { useRecorder } from '../api/use-recorder';
import { crewRolesAt, roleOnTurn, turnAtHand, type MyTurns } from '../model/my-turns';
import { turnsToTieUp } from '../model/tie-up';
import { AgeOfData } from './age-of-data';
import { InstalledLine } from './installed-line';
import { MyTurnsFoot } from './my-turns-foot';
import listStyles from './my-turns.module.css';
import { LostNotice, UnkeptNotice } from './outbox-notices';
import styles from './phone-parts.module.css';
import { TurnItem } from './turn-item';
import { useMyTurns } from './use-my-turns';

/** `/my`: one's own turns first, then those that can be taken with one touch. */
export function MyTurnsScreen() {
  const person = usePerson();
  const { terminals, turns, isLoading, toldAt, error, retry } = useMyTurns();
  const { state, forgetLost } = useOutbox();
  const now = useNow(10);
  const zone = terminals[0]?.zone ?? 'UTC';
  const hand = turnAtHand(turns.mine);
  return (
    <div className={styles.page}>
      <div className={styles.main}>
        <div>
          <h1>My turns</h1>
          <p>
            <Today zone={zone} />, {jobWords(person)}
          </p>
        </div>
        <UnkeptNotice isUnkept={state.storage === 'refused'} />
        <LostNotice lost={state.lost} zone={zone} onRead={forgetLost} />
        <AgeOfData what="Turns" toldAt={toldAt} now={now} zone={zone} />
        <Lists
          isLoading={isLoading}
          error={error}
          retry={retry}
          turns={turns}
          terminals={terminals}
          hand={hand}
        />
        <InstalledLine />
      </div>
      <MyTurnsFoot hand={hand} state={state} zone={zone} />
    </div>
  );
}

function jobWords(person: SignedInPerson): string {
  const jobs = [...new Set(person.roles.map(({ role }) => role))].filter(
    (role) => role === 'conductor' || role === 'engineer',
  );
  return jobs.length === 0 ? person.name : `${jobs.join(' and ')} ${person.name}`;
}

interface ListsProps {
  isLoading: boolean;
  error: Error | null;
  retry: () => void;
  turns: MyTurns;
  terminals: WireTerminal[];
  hand: WireTurn | null;
}

function Lists({ isLoading, error, retry, turns, terminals, hand }: ListsProps) {
  const now = useNow(60);
  const today = formatServiceDate(dateAt(now, terminals[0]?.zone ?? 'UTC'));
  const isEmpty = turns.mine.length + turns.mineOver.length + turns.others.length === 0;
  if (isEmpty && isLoading)
    return <LoadingRows what={`turns for ${today}`} rows={5} rowHeight={72} onRetry={retry} />;
  if (isEmpty && error !== null) return <ErrorState error={error} onRetry={retry} />;
  if (terminals.length === 0)
    return <p>You are not conductor or engineer at any terminal. The administrator gives roles.</p>;
  if (isEmpty)
    return <p>No turns at {terminals.map(({ name }) => name).join(', ')} in the next two hours.</p>;
  return (
    <>
      {turns.mine.length + turns.mineOver.length > 0 ? (
        <>
          <OwnTurns turns={turns} hand={hand} terminals={terminals} />
          <TieUpLine turns={turns} />
        </>
      ) : (
        <NoTurns terminals={terminals} />
      )}
      {terminals.map((terminal) => (
        <OtherTurns
          key={terminal.code}
          terminal={terminal}
          isOnly={terminals.length === 1}
          turns={turns.others.filter((turn) => turn.terminal === terminal.code)}
        />
      ))}
    </>
  );
}

function NoTurns({ terminals }: { terminals: WireTerminal[] }) {
  const person = usePerson();
  const isCrew = terminals.some(({ code }) => crewRolesAt(person, code).length > 0);
  return (
    <p>
      {isCrew
        ? 'You have no turn yet. Take one below.'
        : 'Open a turn for a defect, a note, a blue signal, as your role has it.'}
    </p>
  );
}

function OwnTurns({
  turns,
  hand,
  terminals,
}: {
  turns: MyTurns;
  hand: WireTurn | null;
  terminals: WireTerminal[];
}) {
  const place = (turn: WireTurn): { note?: string } => {
    const name = terminals.find(({ code }) => code === turn.terminal)?.name;
    return terminals.length > 1 && name !== undefined && turn.id !== hand?.id ? { note: name } : {};
  };
  return (
    <ol className={listStyles.list} aria-label="My turns">
      {turns.mineOver.length > 0 && (
        <li className={styles.line}>
          {turns.mineOver.length === 1 ? '1 earlier turn' : `${turns.mineOver.length} earlier turns`}
          <span className={styles.push}>nothing open</span>
        </li>
      )}
      {turns.mine.map((turn) => (
        <li key={turn.id}>
          <TurnItem turn={turn} isHere={turn.id === hand?.id} {...place(turn)} />
        </li>
      ))}
    </ol>
  );
}

/** The way to leave a set for the day, once one of one's own stands here. */
function TieUpLine({ turns }: { turns: MyTurns }) {
  const [first] = turnsToTieUp([...turns.mine, ...turns.mineOver]);
  if (first === undefined) return null;
  const isPlanned = first.kind === 'tie-up' && (first.tiedUp ?? null) === null;
  return (
    <Link
      className={`${styles.button} ${styles.wide}`}
      to={isPlanned ? `/my/tie-up?turn=${first.id}` : '/my/tie-up'}
    >
      {isPlanned && first.set !== null ? `Tie up set ${first.set}` : 'Tie up a set'}
    </Link>
  );
}

function OtherTurns({
  terminal,
  turns,
  isOnly,
}: {
  terminal: WireTerminal;
  turns: WireTurn[];
  isOnly: boolean;
}) {
  if (turns.length === 0) return null;
  return (
    <section aria-labelledby={`others-${terminal.code}`}>
      <h2 id={`others-${terminal.code}`} className={listStyles.heading}>
        {isOnly ? 'Other turns in the next two hours' : `${terminal.name}, next two hours`}
      </h2>
      <ol className={listStyles.list}>
        {turns.map((turn) => (
          <li key={turn.id}>
            <TurnItem turn={turn} isHere={false} note={crewNote(turn)} />
            <TakeButtons turn={turn} />
          </li>
        ))}
      </ol>
    </section>
  );
}

function crewNote(turn: WireTurn): string {
  return turn.crew.length === 0 ? 'no crew yet' : turn.crew.map((member) => member.name).join(', ');
}

/** "I have this turn" in one touch, in each job the person may have there that nobody has yet. */
function TakeButtons({ turn }: { turn: WireTurn }) {
  const person = usePerson();
  const record = useRecorder(useOutbox(), turn.id);
  const roles = crewRolesAt(person, turn.terminal).filter(
    (role) => !turn.crew.some((member) => member.as === role),
  );
  if (roleOnTurn(turn, person.id) !== null || roles.length === 0) return null;
  const take = (role: CrewRole): void => {
    void record({ kind: 'crew', person: person.id, as: role }, { label: `I have this turn, ${role}` });
  };
  const train = turn.outbound?.train ?? turn.inbound?.train ?? '';
  return (
    <div className={`${styles.buttons} ${listStyles.take}`}>
      {roles.map((role) => (
        <button
          key={role}
          type="button"
          className={styles.button}
          aria-label={`I have this turn, train ${train}, as ${role}`}
          onClick={() => take(role)}
        >
          I have this turn{roles.length > 1 ? `, ${role}` : ''}
        </button>
      ))}
    </div>
  );
}
