import { ERROR_STATUSES, errorBodySchema, type RouteSpec } from '@stubpost/shared';
import { z } from 'zod';

type Json = Record<string, unknown>;

const jsonSchemaOf = (schema: z.ZodType, io: 'input' | 'output'): Json => {
  const { $schema: _dialect, ...rest } = z.toJSONSchema(schema, {
    io,
    unrepresentable: 'any',
    target: 'draft-2020-12',
  });
  return rest;
};

/** The interface as an OpenAPI 3.1 document, made from the table of routes. */
export function openApiDocument(routes: readonly RouteSpec[], version: string): Json {
  const paths: Record<string, Record<string, Json>> = {};
  for (const route of routes) {
    const path = route.path.replace(/:(\w+)/g, '{$1}');
    paths[path] = { ...paths[path], [route.method.toLowerCase()]: operationOf(route) };
  }
  return {
    openapi: '3.1.0',
    info: {
      title: 'Stubpost',
      version,
      description:
        'Turnarounds at terminal stations. Times are ISO 8601 in UTC with Z, service dates YYYY-MM-DD, durations whole seconds.',
    },
    tags: [...new Set(routes.map((route) => route.area))].map((name) => ({ name })),
    paths,
    components: {
      schemas: { Error: jsonSchemaOf(errorBodySchema, 'output') },
      securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: 'session cookie' } },
    },
  };
}

function operationOf(route: RouteSpec): Json {
  const body = bodyOf(route);
  return {
    operationId: operationIdOf(route),
    tags: [route.area],
    summary: route.summary,
    ...(route.permission === 'public' ? { security: [] } : { security: [{ session: [] }] }),
    'x-permission': route.permission,
    parameters: [...pathParametersOf(route), ...queryParametersOf(route)],
    ...(body === null ? {} : { requestBody: { required: true, content: body } }),
    responses: responsesOf(route),
  };
}

function operationIdOf(route: RouteSpec): string {
  const words = route.path
    .replace('/api/', '')
    .split(/[/:.-]+/)
    .filter((word) => word !== '');
  return (
    route.method.toLowerCase() + words.map((word) => word.charAt(0).toUpperCase() + word.slice(1)).join('')
  );
}

function pathParametersOf(route: RouteSpec): Json[] {
  return [...route.path.matchAll(/:(\w+)/g)].map(([, name]) => ({
    name,
    in: 'path',
    required: true,
    schema: { type: 'string' },
  }));
}

function queryParametersOf(route: RouteSpec): Json[] {
  if (route.query === undefined) return [];
  const schema = jsonSchemaOf(route.query, 'input');
  const required = new Set((schema.required as string[] | undefined) ?? []);
  return Object.entries((schema.properties as Json | undefined) ?? {}).map(([name, property]) => ({
    name,
    in: 'query',
    required: required.has(name),
    schema: property,
  }));
}

function bodyOf(route: RouteSpec): Json | null {
  if (route.request === undefined) return null;
  if (route.request === 'multipart') {
    const file = {
      type: 'object',
      properties: { file: { type: 'string', format: 'binary' } },
      required: ['file'],
    };
    return { 'multipart/form-data': { schema: file } };
  }
  return { 'application/json': { schema: jsonSchemaOf(route.request, 'input') } };
}

function responsesOf(route: RouteSpec): Json {
  const { response } = route;
  const yes =
    response === undefined
      ? { description: 'done' }
      : {
          description: route.summary,
          content:
            typeof response === 'string'
              ? { [response]: { schema: { type: 'string' } } }
              : { 'application/json': { schema: jsonSchemaOf(response, 'output') } },
        };
  const noes = refusalStatusesOf(route).map((status): [string, Json] => [
    String(status),
    {
      description: describe(status),
      content: { 'application/json': { schema: { $ref: '#/components/schemas/Error' } } },
    },
  ]);
  return { [String(route.status ?? 200)]: yes, ...Object.fromEntries<Json>(noes) };
}

/** Statuses of the refusals a caller should expect, the usual ones included. */
export function refusalStatusesOf(route: RouteSpec): number[] {
  const hasInput = route.request !== undefined || route.query !== undefined;
  const usual = [...(hasInput ? [400] : []), ...(route.permission === 'public' ? [] : [401, 403])];
  return [...new Set([...usual, ...(route.refusals ?? [])])].sort((a, b) => a - b);
}

function describe(status: number): string {
  const codes = Object.entries(ERROR_STATUSES).filter(([, codeStatus]) => codeStatus === status);
  return `codes such as ${codes
    .slice(0, 4)
    .map(([code]) => code)
    .join(', ')}`;
}
