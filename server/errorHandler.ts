import type { ErrorRequestHandler, Request } from 'express';
import { MulterError } from 'multer';
import { problemCodes, type Problem, type ProblemCode } from '../shared/contracts/problems';
import { AppError, fromPostgres } from './errors';

const statusOf = (error: unknown): number | null => {
  const status: unknown = error instanceof Error ? Reflect.get(error, 'status') : null;
  return typeof status === 'number' ? status : null;
};

/** Errors of the middleware in front of us, in our words. */
function fromMiddleware(error: unknown): AppError | null {
  if (error instanceof MulterError) {
    if (error.code === 'LIMIT_FILE_SIZE') return new AppError('too-large', 'A file may have 25 MB.');
    return new AppError('malformed-request', 'The upload cannot be read: send one file in the field "file".');
  }
  if (error instanceof URIError) return new AppError('malformed-request', 'The address cannot be read.');
  switch (statusOf(error)) {
    case 400:
      return new AppError('malformed-request', 'The body cannot be read as JSON.');
    case 413:
      return new AppError('too-large', 'The body is larger than this address accepts (2 MB; 64 kB for signing in and up).');
    case 415:
      return new AppError('unsupported-type', 'The body is in an encoding that is not accepted.');
    default:
      return null;
  }
}

function problemOf(error: AppError, requestId: string): Problem & Record<string, unknown> {
  const { title } = problemCodes[error.code];
  return { ...error.extra, type: `urn:allokarya:problem:${error.code}`, title, status: error.status, code: error.code, detail: error.message, errors: error.errors, requestId };
}

const requestIdOf = (request: Request): string => (typeof request.id === 'string' ? request.id : '');

/** The only place that writes an error. A 500 says nothing internal and carries the request's id. */
export const errorHandler: ErrorRequestHandler = (error, request, response, next) => {
  if (response.headersSent) {
    next(error);
    return;
  }
  const known = error instanceof AppError ? error : (fromPostgres(error) ?? fromMiddleware(error));
  if (known === null) request.log.error({ err: error }, 'request failed');
  const code: ProblemCode = 'internal';
  const answer = known ?? new AppError(code, 'Nothing of what you sent was kept half. Try again; if it stays, tell us the number of this request.');
  const retryAfter = answer.extra['retryAfterSeconds'];
  if (typeof retryAfter === 'number') response.setHeader('Retry-After', String(retryAfter));
  response.status(answer.status).type('application/problem+json').send(JSON.stringify(problemOf(answer, requestIdOf(request))));
};
