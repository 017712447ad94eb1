import { Button } from '@blueprintjs/core';
import { useRouteError } from 'react-router-dom';
import { LoadingRows } from '../components/page-states';
import { faultCode } from '../components/part-boundary';

/** Stands until the first page has come: the ground alone, then words when it takes long. */
export function PageOnItsWay() {
  return (
    <main className="sp-page">
      <LoadingRows what="the page" rows={0} />
    </main>
  );
}

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
