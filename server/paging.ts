import type { z } from 'zod';
import { AppError } from './errors';

/** An opaque cursor: the place in a list after which the next page begins. */
export function encodeCursor(value: unknown): string {
  return Buffer.from(JSON.stringify(value), 'utf8').toString('base64url');
}

/** Reads a cursor back; one that this list did not give is refused as input. */
export function decodeCursor<T>(text: string, schema: z.ZodType<T>): T {
  let value: unknown;
  try {
    value = JSON.parse(Buffer.from(text, 'base64url').toString('utf8'));
  } catch {
    value = undefined;
  }
  const parsed = schema.safeParse(value);
  if (parsed.success) return parsed.data;
  throw new AppError('invalid-input', 'The cursor does not belong to this list.', { errors: [{ path: 'cursor', message: 'Expected is the nextCursor of the page before.' }] });
}
