import { accountRoutes } from './account-routes';
import { alertQualityRoutes } from './alert-quality-routes';
import { dutyRoutes } from './duty-routes';
import { historyRoutes } from './history-routes';
import { recordRoutes } from './record-routes';
import type { RouteSpec } from './route';
import { timetableRoutes } from './timetable-routes';
import { turnAreaRoutes } from './turn-routes';

/**
 * Every route of the service. The guard's permission, the OpenAPI document and the test that walks roles and routes
 * are held against this table; a route that is missing here fails a test.
 */
export const ROUTES: readonly RouteSpec[] = [
  ...accountRoutes,
  ...turnAreaRoutes,
  ...alertQualityRoutes,
  ...historyRoutes,
  ...timetableRoutes,
  ...recordRoutes,
  ...dutyRoutes,
];
