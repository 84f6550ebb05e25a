import { randomUUID } from 'node:crypto';
import { pino } from 'pino';
import type { DestinationStream, Logger } from 'pino';
import { pinoHttp } from 'pino-http';
import type { Request, RequestHandler, Response } from 'express';

/** Names under which secrets travel, at any of the three depths at which we log objects. */
const secretFields = ['password', 'newPassword', 'currentPassword', 'token', 'secret', 'authorization', 'cookie', '["set-cookie"]', '["x-api-key"]', 'apiKey', 'email', 'to'];
const redactedPaths = secretFields.flatMap((field) => {
  const at = (parent: string) => (field.startsWith('[') ? `${parent}${field}` : `${parent}.${field}`);
  return [field, at('*'), at('*.*'), at('*.*.*')];
});

const mailAddress = /[A-Za-z0-9._%+-]+@[A-Za-z0-9-]+(?:\.[A-Za-z0-9-]+)+/g;
const secretInAddress = /([?&](?:token|key|code|secret)=)[^&"\s\\]+/gi;

/** A failed query repeats its parameters, which may be a session or a password's hash; this is how they stand in a line. */
const queryParameters = /\\nparams:(?:[^"\\]|\\[^n]|\\n(?!\s+at ))*/g;

/** A serialised error, and the errors that caused it, without the list of a query's parameters. */
function withoutParameters(serialised: object): object {
  return Object.fromEntries(
    Object.entries(serialised)
      .filter(([name]) => !['params', 'parameters', 'raw'].includes(name))
      .map(([name, value]: [string, unknown]) => [name, typeof value === 'object' && value !== null && !Array.isArray(value) ? withoutParameters(value) : value]),
  );
}

/**
 * Structured logs, one JSON object a line. Redaction by name catches what we log on purpose; the last
 * hook also catches a mail address or a token that an error message of a library carries in its text.
 */
export function createLogger(level: string, destination?: DestinationStream): Logger {
  return pino(
    {
      level,
      base: null,
      timestamp: pino.stdTimeFunctions.isoTime,
      serializers: { err: (error: Error) => (error instanceof Error ? withoutParameters(pino.stdSerializers.errWithCause(error)) : error) },
      redact: { paths: redactedPaths, censor: '[removed]' },
      hooks: { streamWrite: (line) => line.replace(queryParameters, '').replace(mailAddress, '[mail address]').replace(secretInAddress, '$1[removed]') },
    },
    ...(destination === undefined ? [] : [destination]),
  );
}

const acceptableId = /^[A-Za-z0-9-]{8,64}$/;

/**
 * Gives every request an id (`req.id`, header X-Request-Id) and a child logger (`req.log`), and writes one
 * line when it is answered. Headers and the query are not logged: they carry cookies, keys and searches.
 */
export function requestLogger(logger: Logger): RequestHandler {
  return pinoHttp<Request, Response>({
    logger,
    genReqId: (request, response) => {
      const sent = request.headers['x-request-id'];
      const id = typeof sent === 'string' && acceptableId.test(sent) ? sent : randomUUID();
      response.setHeader('X-Request-Id', id);
      return id;
    },
    serializers: {
      err: withoutParameters,
      req: (request: { id: string; method: string; url: string }) => ({ id: request.id, method: request.method, path: request.url.split('?')[0] }),
      res: (response: { statusCode: number }) => ({ statusCode: response.statusCode }),
    },
    customLogLevel: (_request, response, error) => (error !== undefined || response.statusCode >= 500 ? 'error' : 'info'),
    autoLogging: { ignore: (request) => request.url === '/api/v1/health' },
  });
}
