import type { NextFunction, Request, Response } from 'express';
import helmet from 'helmet';

/**
 * Headers of every answer. Scripts only from this server and none inline; style attributes are allowed, as the
 * component and timeline libraries set them. What only makes sense over https is left out on plain http, where
 * browsers would block every script (upgrade-insecure-requests) or complain.
 */
export function securityHeaders(isSecure: boolean) {
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'"],
        scriptSrcAttr: ["'none'"],
        styleSrc: ["'self'", "'unsafe-inline'"],
        imgSrc: ["'self'", 'data:', 'blob:'],
        fontSrc: ["'self'", 'data:'],
        connectSrc: ["'self'"],
        workerSrc: ["'self'"],
        manifestSrc: ["'self'"],
        objectSrc: ["'none'"],
        baseUri: ["'none'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
        upgradeInsecureRequests: isSecure ? [] : null,
      },
    },
    strictTransportSecurity: isSecure ? { maxAge: 365 * 24 * 60 * 60, includeSubDomains: false } : false,
    crossOriginOpenerPolicy: isSecure,
    originAgentCluster: isSecure,
    referrerPolicy: { policy: 'no-referrer' },
  });
}

/** What the interface answers is personal or momentary: nobody keeps it, unless the route says otherwise. */
export function keepNothing(_request: Request, response: Response, next: NextFunction): void {
  response.setHeader('Cache-Control', 'no-store');
  next();
}
