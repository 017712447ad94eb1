import { useEffect, useState } from 'react';
import { joinRegions } from '../lib/announcer';

/**
 * The two live regions, in the page from the start and empty: a polite one, and an assertive one for "Act now" only.
 * Stands once, outside of everything that comes and goes.
 */
export function StatusRegions() {
  const [polite, setPolite] = useState('');
  const [assertive, setAssertive] = useState('');
  useEffect(() => joinRegions(setPolite, setAssertive), []);
  return (
    <div className="unseen">
      <div role="status" aria-live="polite" data-region="polite">
        {polite}
      </div>
      <div role="alert" aria-live="assertive" data-region="act-now">
        {assertive}
      </div>
    </div>
  );
}
