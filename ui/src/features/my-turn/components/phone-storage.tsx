import { buildId } from '../../../config/environment';
import { useInstalled, usePersisted } from '../../../lib/installed';
import styles from './outbox.module.css';
import parts from './phone-parts.module.css';

/** Whether the app is on the home screen, whether the phone promises to keep what is unsent, and how to get there. */
export function PhoneStorage() {
  const { isInstalled, install } = useInstalled();
  const { isPersisted, ask } = usePersisted();
  return (
    <section className={styles.facts} aria-labelledby="phone-storage">
      <h2 id="phone-storage">This phone</h2>
      <p>
        <b>{isInstalled ? 'Opened from the home screen.' : 'Not on the home screen.'}</b>{' '}
        {isInstalled
          ? 'It opens without a signal.'
          : 'A phone may clear what a page keeps when the page was not used for 7 days.'}
      </p>
      <p>
        <b>{keepWords(isPersisted)}</b>
      </p>
      <div className={parts.buttons}>
        {install !== null && !isInstalled && (
          <button type="button" className={parts.button} onClick={install}>
            Put on home screen
          </button>
        )}
        {isPersisted === false && (
          <button type="button" className={parts.button} onClick={ask}>
            Ask the phone to keep it
          </button>
        )}
      </div>
      {!isInstalled && <HomeScreenHelp />}
      <p className="muted">Version {buildId}</p>
    </section>
  );
}

function keepWords(isPersisted: boolean | null): string {
  if (isPersisted === null) return 'This browser does not say whether it keeps what is unsent.';
  return isPersisted
    ? 'The phone has promised to keep what is unsent.'
    : 'The phone has not promised to keep what is unsent when its storage runs low.';
}

/** The two ways of putting a page on the home screen, in the words of the phones' own menus. */
function HomeScreenHelp() {
  return (
    <details className={styles.help}>
      <summary>How to put it on the home screen</summary>
      <p>
        <b>iPhone, Safari</b>
      </p>
      <ol>
        <li>Touch the share sign, the square with the arrow up.</li>
        <li>Choose “Add to Home Screen”, then “Add”.</li>
        <li>Open it from the home screen and sign in there once: it keeps its own entries.</li>
      </ol>
      <p>
        <b>Android, Chrome</b>
      </p>
      <ol>
        <li>Open the menu, the three dots at the top.</li>
        <li>Choose “Add to Home screen”, then “Install”.</li>
        <li>Open it from the home screen.</li>
      </ol>
    </details>
  );
}
