import { isErrorCode, personHeader, type ErrorBody, type ErrorCode } from '@stubpost/shared';
import { noteServerTime, readDeviceClock } from './use-now';

/** Codes of what can go wrong before a server of ours has answered. */
export const TRANSPORT_CODES = ['transport.unreachable', 'transport.unreadable'] as const;
export type TransportCode = (typeof TRANSPORT_CODES)[number];

/** Why a request did not bring what was asked for. The text for people is made by `errorText`. */
export class ApiError extends Error {
  readonly status: number;
  readonly code: ErrorCode | TransportCode;
  readonly facts: Readonly<Record<string, unknown>>;
  /** Finds the request in the server's log. */
  readonly requestId: string | undefined;

  constructor(problem: {
    status: number;
    code: ErrorCode | TransportCode;
    message: string;
    facts?: Readonly<Record<string, unknown>>;
    requestId?: string;
  }) {
    super(problem.message);
    this.name = 'ApiError';
    this.status = problem.status;
    this.code = problem.code;
    this.facts = problem.facts ?? {};
    this.requestId = problem.requestId;
  }
}

/** Values of a query; what is undefined is left out. */
export type QueryValues = Readonly<Record<string, string | number | boolean | undefined>>;

export interface RequestOptions {
  signal?: AbortSignal;
  query?: QueryValues;
  /** The request counts only as this person's: with somebody else signed in it is refused. */
  asPerson?: string;
}

function address(path: string, query: QueryValues | undefined): string {
  const parts = new URLSearchParams();
  for (const [name, value] of Object.entries(query ?? {})) {
    if (value !== undefined) parts.set(name, String(value));
  }
  const text = parts.toString();
  return text === '' ? path : `${path}?${text}`;
}

function noteDateHeader(response: Response, askedAt: number): void {
  const second = Date.parse(response.headers.get('date') ?? '');
  // The header has whole seconds: the server's clock stood somewhere inside that second when it answered.
  if (!Number.isNaN(second)) {
    noteServerTime({ earliest: second - readDeviceClock(), latest: second + 999 - askedAt });
  }
}

async function refusalOf(response: Response): Promise<ApiError> {
  const body = (await response.json().catch(() => null)) as Partial<ErrorBody> | null;
  if (body === null || typeof body.code !== 'string' || !isErrorCode(body.code)) {
    return new ApiError({
      status: response.status,
      code: 'transport.unreadable',
      message: `The answer with status ${response.status} has no known code`,
    });
  }
  return new ApiError({
    status: response.status,
    code: body.code,
    message: body.message ?? body.code,
    facts: body.facts ?? {},
    ...(body.requestId === undefined ? {} : { requestId: body.requestId }),
  });
}

async function send(
  method: string,
  path: string,
  options: RequestOptions & { body?: BodyInit; type?: string },
) {
  const askedAt = readDeviceClock();
  const headers: Record<string, string> = { accept: 'application/json' };
  if (options.type !== undefined) headers['content-type'] = options.type;
  if (options.asPerson !== undefined) headers[personHeader] = options.asPerson;
  let response: Response;
  try {
    response = await fetch(address(path, options.query), {
      method,
      headers,
      credentials: 'same-origin',
      ...(options.body === undefined ? {} : { body: options.body }),
      ...(options.signal === undefined ? {} : { signal: options.signal }),
    });
  } catch (problem) {
    if (options.signal?.aborted === true) throw problem;
    throw new ApiError({ status: 0, code: 'transport.unreachable', message: 'The server did not answer' });
  }
  noteDateHeader(response, askedAt);
  if (!response.ok) throw await refusalOf(response);
  return response;
}

async function answer<T>(response: Response): Promise<T> {
  const text = await response.text();
  // A route without a body (204) is asked for as `undefined` by its caller.
  if (text === '') return undefined as T;
  try {
    return JSON.parse(text) as T;
  } catch {
    throw new ApiError({
      status: response.status,
      code: 'transport.unreadable',
      message: 'The answer is not JSON',
    });
  }
}

async function sendJson<T>(method: string, path: string, body: unknown, options: RequestOptions): Promise<T> {
  const content = body === undefined ? {} : { body: JSON.stringify(body), type: 'application/json' };
  return answer<T>(await send(method, path, { ...options, ...content }));
}

/** The one way to the service. Throws `ApiError`; draws nothing. */
export const api = {
  get: <T>(path: string, options: RequestOptions = {}): Promise<T> =>
    sendJson<T>('GET', path, undefined, options),
  post: <T>(path: string, body?: unknown, options: RequestOptions = {}): Promise<T> =>
    sendJson<T>('POST', path, body, options),
  put: <T>(path: string, body?: unknown, options: RequestOptions = {}): Promise<T> =>
    sendJson<T>('PUT', path, body, options),
  delete: <T = undefined>(path: string, options: RequestOptions = {}): Promise<T> =>
    sendJson<T>('DELETE', path, undefined, options),
  /** A file and its fields as multipart; the browser writes the content type with its boundary. */
  upload: async <T>(path: string, form: FormData, options: RequestOptions = {}): Promise<T> =>
    answer<T>(await send('POST', path, { ...options, body: form })),
};

/** Whether a failure is our refusal with this code. */
export function isRefusal(problem: unknown, code: ErrorCode): boolean {
  return problem instanceof ApiError && problem.code === code;
}
