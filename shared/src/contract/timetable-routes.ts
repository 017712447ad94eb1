import { z } from 'zod';
import type { RouteSpec } from './route';
import {
  activationSchema,
  derivedTurnSchema,
  derivedTurnsQuerySchema,
  differenceQuerySchema,
  timetableDifferenceSchema,
  timetableHeadSchema,
  timetableSchema,
  uploadReceiptSchema,
} from './timetables';

const area = 'Timetables';

/** Imported timetables: bringing in, looking at, making active. */
export const timetableRoutes: readonly RouteSpec[] = [
  {
    method: 'GET',
    path: '/api/timetables',
    permission: 'timetables.read',
    area,
    summary: 'Imported timetables, newest first',
    response: z.array(timetableHeadSchema),
  },
  {
    method: 'POST',
    path: '/api/timetables',
    permission: 'timetables.import',
    area,
    summary:
      'Bring in a GTFS zip (field file; optional routeTypes, rail by default); it is read in the background',
    request: 'multipart',
    response: uploadReceiptSchema,
    status: 202,
    refusals: [413, 422],
  },
  {
    method: 'GET',
    path: '/api/timetables/:id',
    permission: 'timetables.read',
    area,
    summary: 'One timetable: state, progress, problems with file and line, summary',
    response: timetableSchema,
    refusals: [404],
  },
  {
    method: 'GET',
    path: '/api/timetables/:id/turns',
    permission: 'timetables.read',
    area,
    summary: 'Turns derived for a service date, before any terminal is chosen',
    query: derivedTurnsQuerySchema,
    response: z.array(derivedTurnSchema),
    refusals: [404, 409],
  },
  {
    method: 'GET',
    path: '/api/timetables/:id/difference',
    permission: 'timetables.read',
    area,
    summary: 'Turns added, removed and moved against the running timetable, by date and terminal',
    query: differenceQuerySchema,
    response: timetableDifferenceSchema,
    refusals: [404, 409],
  },
  {
    method: 'POST',
    path: '/api/timetables/:id/activation',
    permission: 'timetables.import',
    area,
    summary: 'Make a timetable the running one from a service date on, for chosen terminals',
    request: activationSchema,
    response: timetableSchema,
    refusals: [404, 409],
  },
  {
    method: 'POST',
    path: '/api/timetables/:id/roll-back',
    permission: 'timetables.import',
    area,
    summary:
      'Take a timetable back that was made active last; the one before it runs again and is the answer',
    response: timetableSchema,
    refusals: [404, 409],
  },
];
