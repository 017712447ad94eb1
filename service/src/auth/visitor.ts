import type { Request } from 'express';
import type { Visitor } from './sign-in.service';

/** Where a request comes from: its address behind trusted proxies, and what its browser calls itself. */
export function visitorOf(request: Request): Visitor {
  return { address: request.ip ?? 'unknown', device: request.get('user-agent') ?? 'unknown' };
}
