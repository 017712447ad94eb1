import { useQuery } from '@tanstack/react-query';
import { parseInstant, type WireTerminal } from '@stubpost/shared';
import { Link, useMatch, useNavigate, useSearchParams } from 'react-router-dom';
import { Clock, Today } from '../components/clock';
import { PostMark } from '../components/post-mark';
import { standingAlertsQuery } from '../lib/standing-alerts';
import { rememberTerminal } from '../lib/terminal-choice';
import { dateAt, formatServiceDate } from '../lib/time-display';
import { MeMenu } from './me-menu';
import styles from './shell.module.css';

function TerminalPlace({ terminal, terminals }: { terminal: WireTerminal; terminals: WireTerminal[] }) {
  const navigate = useNavigate();
  const isBoard = useMatch('/board/:terminal') !== null;
  const isTurn = useMatch('/turns/:turnId') !== null;
  const [search, setSearch] = useSearchParams();
  const choose = (code: string): void => {
    rememberTerminal(code);
    if (isBoard || isTurn) void navigate(`/board/${code}`);
    else {
      search.set('terminal', code);
      setSearch(search);
    }
  };
  if (terminals.length < 2) return <div className={styles.place}>{terminal.name}</div>;
  return (
    <div className={styles.place}>
      <select aria-label="Terminal" value={terminal.code} onChange={(event) => choose(event.target.value)}>
        {terminals.map(({ code, name }) => (
          <option key={code} value={code}>
            {name}
          </option>
        ))}
      </select>
    </div>
  );
}

function AlertCount({ terminal }: { terminal: string }) {
  const { data } = useQuery(standingAlertsQuery(terminal));
  const notTaken = (data ?? []).filter(({ state }) => state === 'raised').length;
  return (
    <Link className={styles.count} to="/alerts">
      <span>
        <b>{data?.length ?? '–'}</b> {data?.length === 1 ? 'alert' : 'alerts'}
      </span>
      {notTaken > 0 && <span className={styles.notTaken}>{notTaken} not taken</span>}
    </Link>
  );
}

/** The day that is looked at: the board's window can start at another one. */
function ServiceDate({ zone }: { zone: string }) {
  const startAt = parseInstant(useSearchParams()[0].get('at') ?? '');
  if (startAt === null) return <Today zone={zone} />;
  const date = dateAt(startAt, zone);
  return <time dateTime={date}>{formatServiceDate(date)}</time>;
}

export interface TopBarProps {
  terminal: WireTerminal | null;
  terminals: WireTerminal[];
  zone: string;
  onFind: () => void;
}

/** Terminal, service date, clock with zone, alerts, find, me: the order never changes. */
export function TopBar({ terminal, terminals, zone, onFind }: TopBarProps) {
  return (
    <div className={styles.topbar}>
      <Link className={styles.brand} to="/">
        <PostMark />
        Stubpost
      </Link>
      {terminal !== null && <TerminalPlace terminal={terminal} terminals={terminals} />}
      <div className={styles.date}>
        <ServiceDate zone={zone} />
      </div>
      <Clock zone={zone} className={styles.clock ?? ''} />
      {terminal !== null && <AlertCount terminal={terminal.code} />}
      <div className={styles.find}>
        {terminal !== null && (
          <button type="button" onClick={onFind} aria-keyshortcuts="Control+K">
            <span>Find train, set, car, person or track</span>
            <kbd>Ctrl K</kbd>
          </button>
        )}
      </div>
      <MeMenu />
    </div>
  );
}
