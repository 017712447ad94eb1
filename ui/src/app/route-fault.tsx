import { Button } from '@blueprintjs/core';
import { useRouteError } from 'react-router-dom';
import { faultCode } from '../components/part-boundary';

/** A page could not be loaded at all: a newer version was put in place, or the network is gone. */
export function RouteFault() {
  const problem = useRouteError();
  return (
    <main className="sp-page" role="alert">
      <h1>This page did not load</h1>
      <p>The server could not be reached, or a newer version was put in its place.</p>
      <div className="sp-actions">
        <Button intent="primary" onClick={() => window.location.reload()}>
          Reload page
        </Button>
        <span className="muted">code {faultCode(problem)}</span>
      </div>
    </main>
  );
}
