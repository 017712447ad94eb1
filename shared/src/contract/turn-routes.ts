import { z } from 'zod';
import { alertSchema, alertsQuerySchema, closeAlertSchema, setAsideSchema } from './alerts';
import { liveQuerySchema } from './live';
import { createPlanSchema, stepPlanSchema } from './plans';
import type { RouteSpec } from './route';
import { putSetSchema, setSchema } from './sets';
import { recordEntrySchema, wireEntrySchema } from './entries';
import { correctionsQuerySchema, listedCorrectionSchema } from './record-corrections';
import {
  boardQuerySchema,
  boardSchema,
  createTurnSchema,
  entryReceiptSchema,
  findQuerySchema,
  foundTurnSchema,
  turnSchema,
} from './turns';

const boardRoutes: RouteSpec[] = [
  {
    method: 'GET',
    path: '/api/board',
    permission: 'board.read',
    terminal: 'query',
    area: 'Turns',
    summary:
      'Turns of a terminal in a half-open range of instants (20 min back to 4 h ahead), or of a service day',
    query: boardQuerySchema,
    response: boardSchema,
    refusals: [404],
  },
  {
    method: 'GET',
    path: '/api/find',
    permission: 'board.read',
    terminal: 'query',
    area: 'Turns',
    summary: 'Find turns by train, set, car, person or track',
    query: findQuerySchema,
    response: z.array(foundTurnSchema),
    refusals: [404],
  },
  {
    method: 'GET',
    path: '/api/live',
    permission: 'board.read',
    terminal: 'query',
    area: 'Live',
    summary: 'Changes of a terminal as server-sent events; Last-Event-ID goes on where it stopped',
    query: liveQuerySchema,
    response: 'text/event-stream',
    refusals: [404],
  },
];

const turnRoutes: RouteSpec[] = [
  {
    method: 'POST',
    path: '/api/turns',
    permission: 'turns.create',
    terminal: 'body',
    area: 'Turns',
    summary: 'Enter an extra turn; an unknown track is added to the terminal',
    request: createTurnSchema,
    response: turnSchema,
    status: 201,
    refusals: [404],
  },
  {
    method: 'GET',
    path: '/api/turns/:id',
    permission: 'board.read',
    terminal: 'subject',
    area: 'Turns',
    summary: 'One turn',
    response: turnSchema,
    refusals: [404],
  },
  {
    method: 'GET',
    path: '/api/turns/:id/entries',
    permission: 'entries.read',
    terminal: 'subject',
    area: 'Turns',
    summary: 'The entries of a turn in sequence order',
    response: z.array(wireEntrySchema),
    refusals: [404],
  },
  {
    method: 'POST',
    path: '/api/turns/:id/entries',
    permission: 'entries.record',
    terminal: 'subject',
    area: 'Turns',
    summary: 'Record what has happened; the same id again gives the same receipt with status 200',
    request: recordEntrySchema,
    response: entryReceiptSchema,
    status: 201,
    refusals: [404, 409],
  },
];

const correctionRoutes: RouteSpec[] = [
  {
    method: 'GET',
    path: '/api/records/corrections',
    permission: 'corrections.read',
    terminal: 'query',
    area: 'Records',
    summary:
      'Corrections and withdrawals asked for after a departure, the latest first; those that wait, or all',
    query: correctionsQuerySchema,
    response: z.array(listedCorrectionSchema),
    refusals: [404],
  },
];

const planRoutes: RouteSpec[] = [
  {
    method: 'GET',
    path: '/api/plans/:id',
    permission: 'plans.read',
    terminal: 'subject',
    area: 'Plans',
    summary: 'One version of a step plan; it never changes',
    response: stepPlanSchema,
    refusals: [404],
  },
  {
    method: 'GET',
    path: '/api/terminals/:code/plans',
    permission: 'plans.read',
    terminal: 'path',
    area: 'Plans',
    summary: 'All versions of the step plans of a terminal, newest first',
    response: z.array(stepPlanSchema),
    refusals: [404],
  },
  {
    method: 'POST',
    path: '/api/terminals/:code/plans',
    permission: 'plans.edit',
    terminal: 'path',
    area: 'Plans',
    summary: 'A new version of a step plan, in force from a service date on',
    request: createPlanSchema,
    response: stepPlanSchema,
    status: 201,
    refusals: [404],
  },
];

const setRoutes: RouteSpec[] = [
  {
    method: 'GET',
    path: '/api/sets',
    permission: 'sets.read',
    area: 'Sets',
    summary: 'Equipment sets with their units',
    response: z.array(setSchema),
  },
  {
    method: 'PUT',
    path: '/api/sets/:label',
    permission: 'sets.edit',
    area: 'Sets',
    summary: 'Say what a set is made of; an unknown set is added',
    request: putSetSchema,
    response: setSchema,
    refusals: [412],
  },
];

const alertRoutes: RouteSpec[] = [
  {
    method: 'GET',
    path: '/api/alerts',
    permission: 'alerts.read',
    terminal: 'query',
    area: 'Alerts',
    summary: 'Alerts, most urgent first',
    query: alertsQuerySchema,
    response: z.array(alertSchema),
  },
  {
    method: 'POST',
    path: '/api/alerts/:id/taking',
    permission: 'alerts.act',
    terminal: 'subject',
    area: 'Alerts',
    summary: 'Take an alert: others see who has it',
    response: alertSchema,
    refusals: [404, 409],
  },
  {
    method: 'POST',
    path: '/api/alerts/:id/setting-aside',
    permission: 'alerts.act',
    terminal: 'subject',
    area: 'Alerts',
    summary: 'Set an alert aside for at most 30 minutes; it returns by itself',
    request: setAsideSchema,
    response: alertSchema,
    refusals: [404, 409],
  },
  {
    method: 'POST',
    path: '/api/alerts/:id/closing',
    permission: 'alerts.act',
    terminal: 'subject',
    area: 'Alerts',
    summary: 'Close an alert with its cause',
    request: closeAlertSchema,
    response: alertSchema,
    refusals: [404, 409],
  },
];

/** Routes of turns, plans, sets, alerts and the live stream. */
export const turnAreaRoutes: readonly RouteSpec[] = [
  ...boardRoutes,
  ...turnRoutes,
  ...correctionRoutes,
  ...planRoutes,
  ...setRoutes,
  ...alertRoutes,
];
