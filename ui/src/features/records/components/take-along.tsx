import { Classes, FormGroup, InputGroup } from '@blueprintjs/core';
import { useId } from 'react';
import { checkerFile, headsFile, logFile } from '../api/log';
import { logFileName, type LogDays } from '../model/log-days';
import styles from './check-log.module.css';

export interface TakeAlongProps {
  days: LogDays;
  onDay: (name: keyof LogDays, day: string) => void;
}

function DayField({ label, day, onDay }: { label: string; day: string; onDay: (day: string) => void }) {
  const id = useId();
  return (
    <FormGroup label={label} labelFor={id}>
      <InputGroup id={id} type="date" required value={day} onValueChange={onDay} />
    </FormGroup>
  );
}

/** Looks like a button, and is the link that it is. */
function Download({ href, name, children }: { href: string; name: string; children: string }) {
  return (
    <a className={Classes.BUTTON} href={href} download={name}>
      {children}
    </a>
  );
}

const headsName = 'stubpost-heads.json';
const checkerName = 'check-log.mjs';

/** Log, heads and checker as files, and how to check without this server. */
export function TakeAlong({ days, onDay }: TakeAlongProps) {
  return (
    <section className="sp-panel" aria-labelledby="take-along">
      <h2 id="take-along">Check it without this server</h2>
      <p>
        Take three files to your own machine. The checker is one file that can be read before it is run; it
        needs Node 20 or later, no network, and nothing of ours.
      </p>
      <form
        className="sp-fields"
        aria-label="Days of receipt in UTC, both included"
        onSubmit={(event) => event.preventDefault()}
      >
        <DayField label="First day, UTC" day={days.from} onDay={(day) => onDay('from', day)} />
        <DayField label="Last day, UTC" day={days.to} onDay={(day) => onDay('to', day)} />
      </form>
      <ol className={styles.files}>
        <li>
          <Download href={headsFile(days)} name={headsName}>
            Daily heads
          </Download>
          <span className="muted">
            {headsName}; take it before the log. Better still: the heads you noted down.
          </span>
        </li>
        <li>
          <Download href={logFile(days)} name={logFileName(days)}>
            Log of these days
          </Download>
          <span className="muted">
            {logFileName(days)}; whole days, one entry a line. Bodies of terminals outside your right are left
            out, their seals are not.
          </span>
        </li>
        <li>
          <Download href={checkerFile} name={checkerName}>
            Checker
          </Download>
          <span className="muted">{checkerName}</span>
        </li>
      </ol>
      <h3>Then, in the folder with the three files</h3>
      <pre className={styles.command} tabIndex={0} aria-label="Command">
        node {checkerName} {logFileName(days)} --heads {headsName} --to {days.to}
      </pre>
      <p>
        With one head from paper or mail instead: <code>--head HASH@NUMBER</code>. It says WHOLE, or BROKEN
        with the line, number and id of the first entry that is wrong, and what it could not check. It ends
        with 0 for whole, 1 for broken, 2 when it could not read.
      </p>
    </section>
  );
}
