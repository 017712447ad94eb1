import type { z } from 'zod';
import type { Permission } from '../access/permissions';

/** Methods our routes use. */
export type RouteMethod = 'GET' | 'POST' | 'PUT' | 'DELETE';

/**
 * Where a route's terminal is found: in its query, in its path, in its body, on the thing that its path names
 * (known only once that is loaded), or nowhere.
 */
export type TerminalPlace = 'query' | 'path' | 'body' | 'subject' | 'none';

/** One route as both the OpenAPI document and the walk over all roles need it. */
export interface RouteSpec {
  method: RouteMethod;
  /** Path below the server's root with `:names`, e.g. `/api/terminals/:code/tracks`. */
  path: string;
  /** What it takes to be let in; `public` asks for nobody. */
  permission: Permission | 'public';
  /** `none` when absent: the permission may then be held at any terminal. */
  terminal?: TerminalPlace;
  summary: string;
  /** Area heading in the readable pages. */
  area: string;
  query?: z.ZodType;
  /** JSON body of the request; for files `multipart`. */
  request?: z.ZodType | 'multipart';
  /** JSON body of the answer; for anything else its media type. Absent where there is none. */
  response?:
    z.ZodType | 'text/event-stream' | 'text/html' | 'application/x-ndjson' | 'text/csv' | 'text/javascript';
  /** Status of the answer that says yes; 200 when absent. */
  status?: 200 | 201 | 202 | 204;
  /** Refusals that callers should expect, by status, beside 400, 401 and 403. */
  refusals?: readonly number[];
}
