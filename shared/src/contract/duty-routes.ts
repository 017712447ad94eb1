import { dutyRosterSchema, updateDutyRosterSchema } from './duty';
import { messageBoxesSchema, takingSchema } from './messages';
import type { RouteSpec } from './route';

/** Routes of the duty roster, of outgoing messages and of the link in them. */
export const dutyRoutes: readonly RouteSpec[] = [
  {
    method: 'GET',
    path: '/api/terminals/:code/duty-roster',
    permission: 'roster.read',
    terminal: 'path',
    area: 'Duty roster',
    summary: 'Who is on the desk when, and who is told when nobody takes an alert',
    response: dutyRosterSchema,
    refusals: [404],
  },
  {
    method: 'PUT',
    path: '/api/terminals/:code/duty-roster',
    permission: 'roster.edit',
    terminal: 'path',
    area: 'Duty roster',
    summary: 'Replace the roster, the quiet hours and the steps of a terminal',
    request: updateDutyRosterSchema,
    response: dutyRosterSchema,
    refusals: [404, 412],
  },
  {
    method: 'GET',
    path: '/api/messages',
    permission: 'messages.read',
    area: 'Messages',
    summary: 'Outgoing messages with every try, and what lies in the local boxes',
    response: messageBoxesSchema,
  },
  {
    method: 'GET',
    path: '/api/takings/:token',
    permission: 'public',
    area: 'Messages',
    summary: 'What the link in a message is about; changes nothing',
    response: takingSchema,
    refusals: [404],
  },
  {
    method: 'POST',
    path: '/api/takings/:token',
    permission: 'public',
    area: 'Messages',
    summary: 'Take the alert as the person the link was sent to; works once',
    response: takingSchema,
    refusals: [404, 409],
  },
];
