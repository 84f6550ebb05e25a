import { z } from 'zod';
import { problemSchema } from '../../shared/contracts/problems';
import { ApiError } from './problem';

/** On the web the API has the page's own origin; native builds name theirs. */
const origin = process.env.EXPO_PUBLIC_API_URL ?? '';
const base = `${origin}/api/v1`;
const TIMEOUT_MS = 30_000;
/** For answers of which only the failure is parsed. */
const unreadable = z.never();

export type Method = 'POST' | 'PUT' | 'PATCH' | 'DELETE';

interface RequestOptions {
  headers?: Record<string, string>;
  signal?: AbortSignal;
  timeoutMs?: number;
}

async function request(url: string, init: RequestInit, { headers, signal, timeoutMs = TIMEOUT_MS }: RequestOptions): Promise<Response> {
  const timeout = AbortSignal.timeout(timeoutMs);
  try {
    return await fetch(url, {
      credentials: 'include',
      ...init,
      headers: { Accept: 'application/json', ...init.headers, ...headers },
      signal: signal ? AbortSignal.any([signal, timeout]) : timeout,
    });
  } catch (error) {
    if (signal?.aborted) throw error;
    throw new ApiError(timeout.aborted ? { kind: 'timeout', afterMs: timeoutMs } : { kind: 'network' });
  }
}

async function bodyOf(response: Response): Promise<unknown> {
  if (response.status === 204) return undefined;
  try {
    return await response.json();
  } catch {
    return undefined;
  }
}

async function answer<Schema extends z.ZodType>(response: Response, schema: Schema): Promise<z.output<Schema>> {
  const path = new URL(response.url || base, 'http://localhost').pathname;
  const body = await bodyOf(response);
  if (!response.ok) {
    const problem = problemSchema.safeParse(body);
    if (!problem.success) throw new ApiError({ kind: 'invalid-answer', status: response.status, path });
    const { status, code, title, detail, errors, requestId } = problem.data;
    throw new ApiError({ kind: 'problem', status, code, title, detail, errors, requestId });
  }
  const parsed = schema.safeParse(body);
  if (!parsed.success) {
    console.error(`The answer of ${path} does not fit its contract`, parsed.error.issues);
    throw new ApiError({ kind: 'invalid-answer', status: response.status, path });
  }
  return parsed.data;
}

/** Requests under /api/v1; paths begin with a slash and carry their query. Answers are parsed with their contract. */
export const api = {
  async get<Schema extends z.ZodType>(path: string, schema: Schema, options: RequestOptions = {}): Promise<z.output<Schema>> {
    return answer(await request(`${base}${path}`, {}, options), schema);
  },

  /** Plain text, as citations come. */
  async text(path: string, options: RequestOptions = {}): Promise<string> {
    const response = await request(`${base}${path}`, { headers: { Accept: 'text/plain, application/x-bibtex' } }, options);
    return response.ok ? response.text() : answer(response, unreadable);
  },

  /** A FormData body is sent as multipart, anything else as JSON; `undefined` sends none. */
  async send<Schema extends z.ZodType>(method: Method, path: string, body: unknown, schema: Schema, options: RequestOptions = {}): Promise<z.output<Schema>> {
    const multipart = body instanceof FormData;
    const init: RequestInit = { method };
    if (multipart) init.body = body;
    else if (body !== undefined) {
      init.body = JSON.stringify(body);
      init.headers = { 'Content-Type': 'application/json' };
    }
    return answer(await request(`${base}${path}`, init, options), schema);
  },

  /** Address of a file or page of the API, for links and downloads. */
  href(path: string): string {
    return `${base}${path}`;
  },

  /** Sign-in and its kin live outside /api/v1 and answer in their own shape. Returns the parsed body. */
  async auth(path: string, body: unknown): Promise<{ status: number; body: unknown }> {
    const response = await request(
      `${origin}/api/auth${path}`,
      { method: 'POST', body: JSON.stringify(body ?? {}), headers: { 'Content-Type': 'application/json' } },
      {},
    );
    return { status: response.status, body: await bodyOf(response) };
  },
};

/** A query string from what is set; arrays are joined by commas. */
export function queryString(values: Record<string, string | number | boolean | readonly string[] | null | undefined>): string {
  const parameters = new URLSearchParams();
  for (const [name, value] of Object.entries(values)) {
    if (value === null || value === undefined || value === '') continue;
    const text = Array.isArray(value) ? value.join(',') : String(value);
    if (text !== '') parameters.set(name, text);
  }
  const text = parameters.toString();
  return text ? `?${text}` : '';
}
