import { alertQualityQuerySchema, alertQualitySchema } from './alert-quality';
import type { RouteSpec } from './route';

/** Route of the quality of alerts. It looks back on a desk's work, so it takes the right to read history. */
export const alertQualityRoutes: RouteSpec[] = [
  {
    method: 'GET',
    path: '/api/alerts/quality',
    permission: 'history.read',
    terminal: 'query',
    area: 'Alerts',
    summary:
      'How useful the alerts of a desk were: load per 10 minutes, bursts, priorities, sources, repeaters, standing, untaken, precision, warning',
    query: alertQualityQuerySchema,
    response: alertQualitySchema,
    refusals: [404],
  },
];
