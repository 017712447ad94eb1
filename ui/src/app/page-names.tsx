import type { Permission } from '@stubpost/shared';
import { may } from '@stubpost/shared';
import { NavLink } from 'react-router-dom';
import { usePerson } from '../lib/session';
import { DemoLabel } from './demo-label';
import { LiveMark } from './live-mark';
import styles from './shell.module.css';

interface PageName {
  name: string;
  to: string;
  permission: Permission;
  /** Further addresses that belong to the page. */
  also?: RegExp;
  /** Only for people who work on trains themselves. */
  crewOnly?: boolean;
}

const PAGES: readonly PageName[] = [
  { name: 'My turns', to: '/my', permission: 'entries.record', crewOnly: true },
  { name: 'Board', to: '/board', permission: 'board.read', also: /^\/turns\// },
  { name: 'Alerts', to: '/alerts', permission: 'alerts.read' },
  { name: 'Roster', to: '/desk/roster', permission: 'roster.read' },
  { name: 'History', to: '/history', permission: 'history.read' },
  { name: 'Corrections', to: '/records/corrections', permission: 'corrections.read' },
  { name: 'Check the log', to: '/records/check', permission: 'records.read' },
  { name: 'Timetables', to: '/timetables', permission: 'timetables.read' },
  { name: 'Set-up', to: '/setup', permission: 'plans.read' },
  { name: 'People', to: '/people', permission: 'people.manage' },
  { name: 'Messages', to: '/status/boxes', permission: 'messages.read' },
];

/** Names of the pages a person may open. Help stands last, at every desk and on every page. */
export function PageNames({ zone, path }: { zone: string; path: string }) {
  const person = usePerson();
  const isCrew = person.roles.some(({ role }) => role === 'conductor' || role === 'engineer');
  const pages = PAGES.filter((page) => may(person, page.permission) && (page.crewOnly !== true || isCrew));
  return (
    <div className={styles.pages}>
      <nav aria-label="Pages">
        <ul>
          {pages.map(({ name, to, also }) => (
            <li key={to}>
              <NavLink to={to} {...(also?.test(path) === true ? { 'aria-current': 'page' as const } : {})}>
                {name}
              </NavLink>
            </li>
          ))}
          <li>
            <NavLink to="/help">Help</NavLink>
          </li>
        </ul>
      </nav>
      <div className={styles.state}>
        <DemoLabel />
        <LiveMark zone={zone} />
      </div>
    </div>
  );
}
