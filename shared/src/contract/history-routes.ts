import { z } from 'zod';
import { departureRowSchema, historyImportSchema, onTimeQuerySchema, onTimeSchema } from './history';
import type { RouteSpec } from './route';

const area = 'History';

/** Routes of the on-time history. */
export const historyRoutes: RouteSpec[] = [
  {
    method: 'GET',
    path: '/api/history/on-time',
    permission: 'history.read',
    terminal: 'query',
    area,
    summary: 'Share of departures that left on time by a named rule, with n, interval, delays and groups',
    query: onTimeQuerySchema,
    response: onTimeSchema,
    refusals: [404],
  },
  {
    method: 'GET',
    path: '/api/history/departures',
    permission: 'history.read',
    terminal: 'query',
    area,
    summary: 'The departures behind the figures of the same question',
    query: onTimeQuerySchema,
    response: z.array(departureRowSchema),
    refusals: [404],
  },
  {
    method: 'GET',
    path: '/api/history/departures.csv',
    permission: 'history.read',
    terminal: 'query',
    area,
    summary: 'The same departures as a CSV file',
    query: onTimeQuerySchema,
    response: 'text/csv',
    refusals: [404],
  },
  {
    method: 'POST',
    path: '/api/history/departures',
    permission: 'history.import',
    area,
    summary: 'Load a CSV of past departures: all of its rows, or none and why not',
    request: 'multipart',
    response: z.object({ id: z.string() }),
    status: 202,
    refusals: [413, 422],
  },
  {
    method: 'GET',
    path: '/api/history/imports',
    permission: 'history.import',
    area,
    summary: 'The last loaded and refused tables of past departures',
    response: z.array(historyImportSchema),
  },
  {
    method: 'GET',
    path: '/api/history/imports/:id',
    permission: 'history.import',
    area,
    summary: 'What became of one table',
    response: historyImportSchema,
    refusals: [404],
  },
];
