import { Button } from '@blueprintjs/core';
import { useState } from 'react';
import { errorText } from '../../../lib/error-texts';
import { useLeaveDemo } from '../api/leave-demo';

/** The way out of the demo, for the administrator: a second button in another place says what will happen. */
export function LeaveDemo({ onEmpty }: { onEmpty: () => void }) {
  const [isAsked, setAsked] = useState(false);
  const leave = useLeaveDemo(onEmpty);
  return (
    <section className="sp-panel" aria-labelledby="leave-demo">
      <header>
        <h2 id="leave-demo">This is a demo</h2>
      </header>
      {leave.isError && (
        <p className="sp-problems" role="alert">
          {errorText(leave.error)}
        </p>
      )}
      {leave.isPending ? (
        <p role="status">Leaving. The service starts anew with an empty database.</p>
      ) : (
        <>
          <p>To use Stubpost with your own trains, leave the demo. Its database stays beside the new one.</p>
          <div className="sp-actions">
            <Button aria-expanded={isAsked} onClick={() => setAsked(!isAsked)}>
              {isAsked ? 'Stay in the demo' : 'Leave the demo'}
            </Button>
          </div>
          {isAsked && (
            <div>
              <p>
                Everybody is signed out, and nothing of the demo is shown any more. You then make the first
                administrator.
              </p>
              <Button intent="primary" onClick={() => leave.mutate()}>
                Go on with an empty installation
              </Button>
            </div>
          )}
        </>
      )}
    </section>
  );
}
