import { ERROR_STATUSES, ROUTES, type ErrorCode, type RouteMethod, type RouteSpec } from '@stubpost/shared';

/** What a handler is told about a request. */
export interface FakeRequest {
  method: RouteMethod;
  path: string;
  query: URLSearchParams;
  /** Values of the `:names` in the path. */
  params: Record<string, string>;
  body: unknown;
}

/** A refusal as the service gives it. */
export class FakeRefusal {
  constructor(
    readonly code: ErrorCode,
    readonly facts: Record<string, unknown> = {},
  ) {}
}

type Handler = (request: FakeRequest) => unknown;

interface Rule {
  method: RouteMethod;
  template: string;
  handler: Handler;
}

function match(template: string, path: string): Record<string, string> | null {
  const [wanted, given] = [template.split('/'), path.split('/')];
  if (wanted.length !== given.length) return null;
  const params: Record<string, string> = {};
  for (const [index, part] of wanted.entries()) {
    const value = given[index] ?? '';
    if (part.startsWith(':')) params[part.slice(1)] = decodeURIComponent(value);
    else if (part !== value) return null;
  }
  return params;
}

function routeFor(method: RouteMethod, template: string): RouteSpec | undefined {
  const shape = (path: string): string => path.replace(/:[^/]+/g, ':');
  return ROUTES.find((route) => route.method === method && shape(route.path) === shape(template));
}

/** Holds what the test answers against the wire contract: a fake that disagrees with it must not pass. */
function checked(route: RouteSpec | undefined, answer: unknown): unknown {
  if (route?.response === undefined || typeof route.response === 'string') return answer;
  const result = route.response.safeParse(answer);
  if (!result.success) {
    throw new Error(
      `The fake answer of ${route.method} ${route.path} breaks the contract: ${result.error.message}`,
    );
  }
  return answer;
}

function bodyOf(init: RequestInit | undefined): unknown {
  if (typeof init?.body !== 'string') return init?.body ?? undefined;
  return JSON.parse(init.body) as unknown;
}

function respond(status: number, body: unknown): Response {
  const headers = { 'content-type': 'application/json' };
  return new Response(body === undefined ? null : JSON.stringify(body), { status, headers });
}

/**
 * A service made of answers: takes the place of `fetch`, knows nothing but what the test tells it, and keeps every
 * request. Unknown routes answer 404 as the real one does.
 */
export class FakeServer {
  readonly requests: FakeRequest[] = [];
  private readonly rules: Rule[] = [];
  private readonly realFetch = globalThis.fetch;

  constructor() {
    globalThis.fetch = (input, init) => this.answer(input, init);
  }

  /** Answers a route; later rules win. `answer` is a value, a `FakeRefusal`, or a function of the request. */
  on(method: RouteMethod, template: string, answer: unknown): this {
    const handler: Handler = typeof answer === 'function' ? (answer as Handler) : () => answer;
    this.rules.unshift({ method, template, handler });
    return this;
  }

  /** Answers a route that the test says nothing about. */
  otherwise(method: RouteMethod, template: string, answer: unknown): this {
    this.rules.push({ method, template, handler: () => answer });
    return this;
  }

  /** Refuses a route with one of our codes. */
  refuse(method: RouteMethod, template: string, code: ErrorCode, facts: Record<string, unknown> = {}): this {
    return this.on(method, template, new FakeRefusal(code, facts));
  }

  /** Requests of one route so far, oldest first. */
  sent(method: RouteMethod, template: string): FakeRequest[] {
    return this.requests.filter(
      (request) => request.method === method && match(template, request.path) !== null,
    );
  }

  /** Gives `fetch` back. `renderApp` does it after each test. */
  stop(): void {
    globalThis.fetch = this.realFetch;
  }

  private async answer(input: RequestInfo | URL, init?: RequestInit): Promise<Response> {
    const url = new URL(input instanceof Request ? input.url : input, 'http://127.0.0.1');
    const method = (init?.method ?? 'GET') as RouteMethod;
    await Promise.resolve();
    if (init?.signal?.aborted === true) throw new DOMException('Aborted', 'AbortError');
    for (const rule of this.rules) {
      const params = rule.method === method ? match(rule.template, url.pathname) : null;
      if (params === null) continue;
      const request = { method, path: url.pathname, query: url.searchParams, params, body: bodyOf(init) };
      this.requests.push(request);
      return this.responseTo(rule, await rule.handler(request));
    }
    this.requests.push({
      method,
      path: url.pathname,
      query: url.searchParams,
      params: {},
      body: bodyOf(init),
    });
    return this.refusal(new FakeRefusal('route.unknown'));
  }

  private responseTo(rule: Rule, answer: unknown): Response {
    if (answer instanceof FakeRefusal) return this.refusal(answer);
    const route = routeFor(rule.method, rule.template);
    return respond(answer === undefined ? 204 : (route?.status ?? 200), checked(route, answer));
  }

  private refusal({ code, facts }: FakeRefusal): Response {
    return respond(ERROR_STATUSES[code], { code, message: code, facts, requestId: 'test' });
  }
}
