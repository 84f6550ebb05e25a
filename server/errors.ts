import { problemCodes, type FieldError, type ProblemCode } from '../shared/contracts/problems';

/** The one family of errors that services throw; errorHandler.ts makes problem details of it. */
export class AppError extends Error {
  readonly code: ProblemCode;
  readonly status: number;
  readonly errors: FieldError[];
  /** Further members of the problem document, for example `current` beside `stale-revision`. */
  readonly extra: Record<string, unknown>;

  constructor(code: ProblemCode, detail: string, options: { errors?: FieldError[]; extra?: Record<string, unknown> } = {}) {
    super(detail);
    this.name = 'AppError';
    this.code = code;
    this.status = problemCodes[code].status;
    this.errors = options.errors ?? [];
    this.extra = options.extra ?? {};
  }
}

export const notFound = (what: string) => new AppError('not-found', `${what} does not exist, or is not yours to see.`);
export const notAllowed = (detail: string) => new AppError('not-allowed', detail);

/** Code and constraint of a PostgreSQL error, wherever the driver's error sits in the chain of causes. */
export function postgresError(error: unknown): { code: string; constraint: string | null } | null {
  for (let current = error; current instanceof Error; current = current.cause) {
    const code: unknown = Reflect.get(current, 'code');
    if (typeof code === 'string' && /^[0-9A-Z]{5}$/.test(code)) {
      const constraint: unknown = Reflect.get(current, 'constraint');
      return { code, constraint: typeof constraint === 'string' ? constraint : null };
    }
  }
  return null;
}

/** Named PostgreSQL errors as ours; null for those that are our own fault. KA001 and KA002 come from the immutability triggers. */
export function fromPostgres(error: unknown): AppError | null {
  const found = postgresError(error);
  if (found === null) return null;
  switch (found.code) {
    case '23505':
      if (found.constraint === 'decisions_revision_id_unique') return new AppError('already-decided', 'Somebody decided this revision just before you.');
      if (found.constraint === 'versions_one_preparing' || found.constraint === 'versions_number_unique') return new AppError('freeze-under-way', 'A version is being frozen already.');
      if (found.constraint === 'rechecks_one_open') return new AppError('duplicate', 'A re-check of this record is open already.');
      return new AppError('duplicate', 'The same entry exists already.');
    case 'KA001':
      return new AppError('wrong-state', 'What is submitted, decided or frozen never changes.');
    case 'KA002':
      return new AppError('wrong-state', 'Its state does not allow this step.');
    case '40001':
    case '40P01':
      return new AppError('stale-revision', 'Somebody else changed it at the same moment. Try once more.');
    case '22021':
    case '22P05':
      return new AppError('invalid-input', 'The text holds a character that cannot be stored.');
    default:
      return null;
  }
}
