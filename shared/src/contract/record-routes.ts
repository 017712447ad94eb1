import { z } from 'zod';
import { dailyHeadSchema, logQuerySchema, logStateQuerySchema, logStateSchema } from './records';
import type { RouteSpec } from './route';

const area = 'Records';
const permission = 'records.read';

/** Routes of the sealed log. */
export const recordRoutes: readonly RouteSpec[] = [
  {
    method: 'GET',
    path: '/api/records/log',
    permission,
    area,
    summary:
      'The sealed log, one entry a line, in whole days of receipt (UTC); bodies of terminals outside the right are null',
    query: logQuerySchema,
    response: 'application/x-ndjson',
  },
  {
    method: 'GET',
    path: '/api/records/heads',
    permission,
    area,
    summary: 'The daily heads of the log, oldest first, and last the one of the day that is running',
    query: logQuerySchema,
    response: z.array(dailyHeadSchema),
  },
  {
    method: 'GET',
    path: '/api/records/state',
    permission,
    area,
    summary: 'How far the chain was checked here, when, and what came of it',
    query: logStateQuerySchema,
    response: logStateSchema,
  },
  {
    method: 'GET',
    path: '/api/records/checker',
    permission,
    area,
    summary: 'The checker: one file that needs Node and nothing else',
    response: 'text/javascript',
  },
];
