import express, { type Express, type Request, type Response } from 'express';
import type { z } from 'zod';
import type { FieldError } from '../shared/contracts/problems';
import type { Actor, Context } from './context';
import { AppError, notFound } from './errors';
import { isPermitted, neededRoles, permissions, type Action } from './permissions';
import { unstorableTexts } from './unstorable';

type Method = 'get' | 'post' | 'patch' | 'put' | 'delete';

/** What a handler gets. `actor` is null only on public routes asked without a session. */
export interface RouteInput<Params, Query, Body, Loaded> {
  context: Context;
  actor: Actor;
  visitor: Actor | null;
  params: Params;
  query: Query;
  body: Body;
  loaded: Loaded;
  request: Request;
  response: Response;
}

export interface RouteDefinition<Params, Query, Body, Answer, Loaded> {
  method: Method;
  /** Below /api/v1, Express syntax: `/submissions/:id`. */
  path: string;
  action: Action;
  summary: string;
  params?: z.ZodType<Params>;
  query?: z.ZodType<Query>;
  body?: z.ZodType<Body>;
  /** Shape of the answer; absent where the handler writes the response itself (files, CSV). */
  answer?: z.ZodType<Answer>;
  status?: number;
  /**
   * Finds the thing the address names and throws `not-found` where the person may not know of it. Runs after
   * sign-in and before the role is looked at, so that a stranger's draft answers 404 and not 403.
   */
  load?: (input: { context: Context; actor: Actor; params: Params }) => Promise<Loaded>;
  /** Limits beyond the role (own laboratory), still before the body is looked at. */
  authorize?: (input: { context: Context; actor: Actor; params: Params; loaded: Loaded }) => Promise<void> | void;
  /** Rate limit of this register, asked for once the permission is settled and before anything is read. */
  limit?: (context: Context) => express.RequestHandler;
  /** Express middleware in front, for example a rate limit or multer. Runs after the permission is settled. */
  before?: express.RequestHandler;
  handle: (input: RouteInput<Params, Query, Body, Loaded>) => Promise<Answer>;
}

export interface Route {
  method: Method;
  path: string;
  action: Action;
  summary: string;
  run: (context: Context, visitor: Actor | null, request: Request, response: Response) => Promise<void>;
}

const anonymous: Actor = { id: '', name: '', email: '', emailVerified: false, orcid: null, roles: [], labId: null, labName: null, demonstration: false };

function shown(value: unknown): string {
  if (value === undefined) return 'nothing';
  const text = typeof value === 'string' ? `"${value}"` : JSON.stringify(value);
  return text.length > 60 ? `${text.slice(0, 57)}…` : text;
}

function valueAt(input: unknown, path: readonly PropertyKey[]): unknown {
  return path.reduce<unknown>((value, key) => (typeof value === 'object' && value !== null ? Reflect.get(value, key) : undefined), input);
}

/** Every problem of an input at once: place, what was expected, value found. */
export function fieldErrorsOf(error: z.ZodError, input: unknown): FieldError[] {
  return error.issues.map((issue) => ({ path: issue.path.map(String).join('.'), message: `${issue.message}; found ${shown(valueAt(input, issue.path))}` }));
}

/** Parses or throws `invalid-input` with every problem. */
export function parseInput<T>(schema: z.ZodType<T>, input: unknown, what: string): T {
  const parsed = schema.safeParse(input);
  const unstorable = unstorableTexts(input);
  if (parsed.success && unstorable.length === 0) return parsed.data;
  const errors = [...(parsed.success ? [] : fieldErrorsOf(parsed.error, input)), ...unstorable];
  throw new AppError('invalid-input', `${errors.length === 1 ? 'One entry' : `${errors.length} entries`} of the ${what} cannot be used.`, { errors });
}

function runBefore(handler: express.RequestHandler, request: Request, response: Response): Promise<void> {
  return new Promise((resolve, reject) => {
    void Promise.resolve(handler(request, response, (error?: unknown) => (error == null ? resolve() : reject(error)))).catch(reject);
  });
}

/**
 * Defines one endpoint. The order of checks is fixed here for all of them: session (401), existence as far as the
 * person may know (404), role and laboratory (403), and only then query and body (400).
 */
export function defineRoute<Params = Record<string, never>, Query = Record<string, never>, Body = undefined, Answer = void, Loaded = undefined>(
  definition: RouteDefinition<Params, Query, Body, Answer, Loaded>,
): Route {
  const { method, path, action, summary } = definition;
  return {
    method,
    path,
    action,
    summary,
    async run(context, visitor, request, response) {
      const actor = visitor ?? anonymous;
      if (visitor === null && permissions[action] !== 'public') throw new AppError('not-signed-in', 'Sign in to do this.');
      const params = definition.params?.safeParse(request.params);
      if (params?.success === false) throw notFound('This address');
      const knownParams = params?.data as Params;
      const loaded = (definition.load === undefined ? undefined : await definition.load({ context, actor, params: knownParams })) as Loaded;
      if (!isPermitted(action, visitor?.roles ?? null)) throw new AppError('not-allowed', neededRoles(action));
      await definition.authorize?.({ context, actor, params: knownParams, loaded });
      if (definition.limit !== undefined) await runBefore(definition.limit(context), request, response);
      if (definition.before !== undefined) await runBefore(definition.before, request, response);
      if (response.headersSent) return;
      const query = (definition.query === undefined ? {} : parseInput(definition.query, request.query, 'query')) as Query;
      const body = (definition.body === undefined ? undefined : parseInput(definition.body, request.body ?? {}, 'body')) as Body;
      const answer = await definition.handle({ context, actor, visitor, params: knownParams, query, body, loaded, request, response });
      if (response.headersSent) return;
      if (definition.answer === undefined) {
        response.status(definition.status ?? 204).end();
        return;
      }
      // Tests hold every answer to its contract; in production the types have already done so.
      const checked = context.config.environment === 'test' ? definition.answer.parse(answer) : answer;
      if (definition.status !== undefined) response.status(definition.status);
      response.json(checked);
    },
  };
}

/** Mounts the routes below /api/v1. `visitorOf` reads the session. */
export function mountRoutes(app: Express, routes: readonly Route[], context: Context, visitorOf: (request: Request) => Promise<Actor | null>): void {
  const router = express.Router({ caseSensitive: true });
  for (const route of routes) {
    router[route.method](route.path, async (request, response) => {
      await route.run(context, await visitorOf(request), request, response);
    });
  }
  app.use('/api/v1', router);
  app.use('/api', (request) => {
    throw new AppError('not-found', `There is no ${request.method} ${request.baseUrl}${request.path}.`);
  });
}
