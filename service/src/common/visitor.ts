import type { Request } from 'express';

/** Where a request to come in is from. */
export interface Visitor {
  address: string;
  device: string;
}

/** Where a request comes from: its address behind trusted proxies, and what its browser calls itself. */
export function visitorOf(request: Request): Visitor {
  return { address: request.ip ?? 'unknown', device: request.get('user-agent') ?? 'unknown' };
}
