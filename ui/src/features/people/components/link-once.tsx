import { Button } from '@blueprintjs/core';
import type { OneTimeLink } from '@stubpost/shared';
import { useRef, useState } from 'react';
import { formatStamp } from '../../../lib/time-display';
import styles from './people.module.css';

/** A one-time link, shown this once: nobody can look it up again, only make another. */
export function LinkOnce({ link, name, zone }: { link: OneTimeLink; name: string; zone: string }) {
  const [isCopied, setCopied] = useState(false);
  const field = useRef<HTMLInputElement>(null);
  const copy = async (): Promise<void> => {
    field.current?.select();
    // Without https there is no clipboard: the selected text can still be copied by hand.
    await navigator.clipboard?.writeText(link.url);
    setCopied(navigator.clipboard !== undefined);
  };
  return (
    <div className={styles.link} role="status">
      <p>
        <b>One-time link for {name}.</b> It is shown once, here. It sets a password and works until{' '}
        {formatStamp(link.expiresAt, zone)}.
      </p>
      <div className={styles.linkRow}>
        <input
          ref={field}
          className="bp6-input"
          readOnly
          aria-label="One-time link"
          value={link.url}
          onFocus={(event) => event.currentTarget.select()}
        />
        <Button onClick={() => void copy()}>{isCopied ? 'Copied' : 'Copy'}</Button>
      </div>
    </div>
  );
}
