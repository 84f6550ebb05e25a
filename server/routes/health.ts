import { z } from 'zod';
import { findCurrentVersionNumber } from '../../db/queries/versions';
import { defineRoute } from '../routing';

const healthSchema = z.object({ status: z.enum(['ok', 'starting']), database: z.enum(['ok', 'unreachable']), version: z.string().nullable() });

export const healthRoutes = [
  defineRoute({
    method: 'get',
    path: '/health',
    action: 'read-published',
    summary: 'Whether the register answers; 503 until it is migrated, seeded and has its first version',
    answer: healthSchema,
    handle: async ({ context, response }) => {
      const current = await findCurrentVersionNumber(context.db).catch(() => undefined);
      // A register outside demo mode starts empty and is healthy without a version.
      const ready = current !== undefined && (current !== null || !context.demo);
      if (!ready) response.status(503);
      return { status: ready ? ('ok' as const) : ('starting' as const), database: current === undefined ? ('unreachable' as const) : ('ok' as const), version: current == null ? null : String(current) };
    },
  }),
];
