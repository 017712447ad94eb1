import { may, type Permission } from '@stubpost/shared';
import { NavLink } from 'react-router-dom';
import { usePerson } from '../../lib/session';
import styles from './alert-pages.module.css';

const PAGES: readonly { name: string; to: string; permission: Permission }[] = [
  { name: 'List', to: '/alerts', permission: 'alerts.read' },
  { name: 'Quality', to: '/alerts/quality', permission: 'history.read' },
];

/** The pages about alerts that a person may open; nothing where the list is the only one. */
export function AlertPages() {
  const person = usePerson();
  const pages = PAGES.filter(({ permission }) => may(person, permission));
  if (pages.length < 2) return null;
  return (
    <nav className={styles.pages} aria-label="Pages about alerts">
      {pages.map(({ name, to }) => (
        <NavLink key={to} to={to} end>
          {name}
        </NavLink>
      ))}
    </nav>
  );
}
