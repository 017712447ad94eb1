import { Link } from 'react-router-dom';
import { useInstalled } from '../../../lib/installed';
import { OnwardSign } from './phone-icons';
import styles from './phone-parts.module.css';

/** Whether the app was opened from the home screen, where the phone keeps what it holds; leads to how to put it there. */
export function InstalledLine() {
  const { isInstalled } = useInstalled();
  if (isInstalled) return <p className="muted">Installed on this phone.</p>;
  return (
    <div className={styles.lines}>
      <Link className={styles.line} to="/my/outbox">
        Not installed on this phone
        <span className={styles.push}>
          <OnwardSign size={22} />
        </span>
      </Link>
    </div>
  );
}
