import { ipKeyGenerator, rateLimit } from 'express-rate-limit';
import type { RequestHandler } from 'express';
import type { Context } from './context';
import { AppError } from './errors';

const limits = new WeakMap<Context, RequestHandler>();

/** Limit shared by all calculators of one register, counted a minute and address. */
export function calculatorLimit(context: Context): RequestHandler {
  const known = limits.get(context);
  if (known !== undefined) return known;
  const limit = context.config.limits.calculatorPerMinute;
  const handler = rateLimit({
    windowMs: 60_000,
    limit,
    standardHeaders: 'draft-7',
    legacyHeaders: false,
    // app.ts writes the address it trusts into this header and drops what a client claims.
    keyGenerator: (request) => ipKeyGenerator(String(request.headers['x-client-ip'] ?? request.ip ?? '')),
    handler: (_request, _response, next) => next(new AppError('too-many-requests', `The calculators answer ${limit} calls a minute from one address. Wait a minute.`)),
  });
  limits.set(context, handler);
  return handler;
}
