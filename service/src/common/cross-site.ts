import type { NextFunction, Request, Response } from 'express';
import { Refusal } from './refusal';

/** What counts as this server, and which requests carry its cookie. */
export interface CrossSiteRule {
  /** Origin people reach the service by, without a slash at its end. */
  publicOrigin: string;
  hasCookie(request: Request): boolean;
}

/**
 * Refuses what another site made a browser send: on every request with our cookie, and on every one that changes
 * something. A browser says where a request comes from in Sec-Fetch-Site or Origin; a request with neither is not a
 * browser's and passes.
 */
export function refuseCrossSite(rule: CrossSiteRule) {
  return (request: Request, _response: Response, next: NextFunction): void => {
    const isReading = request.method === 'GET' || request.method === 'HEAD';
    const isConcerned = !isReading || rule.hasCookie(request);
    if (isConcerned && (isForeignFetch(request) || isForeignOrigin(request, rule))) {
      next(new Refusal({ code: 'session.cross_site', message: 'requests from other sites are not taken' }));
      return;
    }
    next();
  };
}

function isForeignFetch(request: Request): boolean {
  const site = request.get('sec-fetch-site');
  return site !== undefined && site !== 'same-origin' && site !== 'none';
}

function isForeignOrigin(request: Request, rule: CrossSiteRule): boolean {
  const origin = request.get('origin');
  if (origin === undefined) return false;
  return origin !== rule.publicOrigin && origin !== `${request.protocol}://${request.host}`;
}
