import { ROUTES } from '@stubpost/shared';
import supertest from 'supertest';
import { docsPage } from '../src/docs/docs-page';
import { bootApp, type Booted } from './support/boot';

interface Operation {
  operationId: string;
  summary: string;
  responses: Record<string, unknown>;
  parameters: { name: string; in: string }[];
}
interface Document {
  openapi: string;
  paths: Record<string, Record<string, Operation>>;
}

let booted: Booted;
beforeAll(async () => {
  booted = await bootApp();
});
afterAll(() => booted.close());
const ask = (address: string) => supertest(booted.app.getHttpServer()).get(address);

describe('GET /api/openapi.json', () => {
  test('describes every route of the table with its parameters and answers', async () => {
    const document = (await ask('/api/openapi.json').expect(200)).body as Document;
    expect(document.openapi).toBe('3.1.0');
    for (const route of ROUTES) {
      const operation = document.paths[route.path.replace(/:(\w+)/g, '{$1}')]?.[route.method.toLowerCase()];
      expect(operation?.summary).toBe(route.summary);
      expect(operation?.responses).toHaveProperty(String(route.status ?? 200));
      for (const [, name] of route.path.matchAll(/:(\w+)/g)) {
        expect(operation?.parameters).toContainEqual(expect.objectContaining({ name, in: 'path' }));
      }
    }
  });

  test('gives every operation a name of its own, and points only at what is there', async () => {
    const answer = await ask('/api/openapi.json').expect(200);
    const document = answer.body as Document;
    const ids = Object.values(document.paths).flatMap((path) =>
      Object.values(path).map(({ operationId }) => operationId),
    );
    expect(new Set(ids).size).toBe(ids.length);
    const pointers = [...answer.text.matchAll(/"\$ref":"([^"]+)"/g)].map(([, pointer]) => pointer);
    expect(new Set(pointers)).toEqual(new Set(['#/components/schemas/Error']));
  });

  test('says which fields a request must have', async () => {
    const { body } = await ask('/api/openapi.json').expect(200);
    expect(body).toMatchObject({
      paths: {
        '/api/session': {
          post: {
            security: [],
            requestBody: {
              content: {
                'application/json': {
                  schema: {
                    anyOf: [
                      { required: ['email', 'password'] },
                      { required: ['badge', 'pin'] },
                      { required: ['badge', 'password'] },
                    ],
                  },
                },
              },
            },
          },
          get: { security: [{ session: [] }] },
        },
      },
    });
  });
});

describe('GET /api/docs', () => {
  test('is a page without any script that names every route', async () => {
    const answer = await ask('/api/docs').expect(200);
    expect(answer.headers['content-type']).toContain('text/html');
    expect(answer.text).not.toMatch(/<script|javascript:|\son\w+=/i);
    for (const route of ROUTES) expect(answer.text).toContain(`<h3>${route.method} ${route.path}</h3>`);
  });

  test('cannot be written into by the words of a route', () => {
    const page = docsPage(
      [{ method: 'GET', path: '/api/x', permission: 'public', area: 'A', summary: '<img src=x>' }],
      '1.0.0',
    );
    expect(page).toContain('&lt;img src=x&gt;');
    expect(page).not.toContain('<img');
  });
});
