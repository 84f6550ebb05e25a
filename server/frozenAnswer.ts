import { createHash } from 'node:crypto';
import type { Response } from 'express';

/** Strong entity tag of an answer: the same content always has the same one. */
export const entityTag = (content: unknown): string => `"${createHash('sha256').update(typeof content === 'string' || content instanceof Uint8Array ? content : JSON.stringify(content)).digest('base64url')}"`;

/**
 * Headers of an answer made from a frozen version alone. Named by its label it never changes and may be kept for
 * ever; asked for as "the current one" it is kept with its tag and asked for again. Express answers 304 by the tag.
 */
export function markFrozen(response: Response, tag: string, options: { explicit: boolean }): void {
  // A client that sends the tag asks whether it still holds, also with `no-cache`, which fetch adds by itself: the tag alone decides.
  if (response.req.headers['if-none-match'] !== undefined) delete response.req.headers['cache-control'];
  response.setHeader('ETag', tag);
  response.setHeader('Cache-Control', options.explicit ? 'public, max-age=31536000, immutable' : 'public, no-cache');
}
