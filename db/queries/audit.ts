import { and, desc, eq, lt, or } from 'drizzle-orm';
import type { Queryable } from '../client';
import { auditEntries, users } from '../schema/index';

export interface NewAuditEntry {
  /** Null for the register itself. */
  actorId: string | null;
  /** Kebab-case verb, for example `roles-set`. */
  action: string;
  targetType: string;
  targetId: string;
  detail?: Record<string, unknown>;
  requestId?: string | null;
}

/** Notes an act of somebody with power over others' data; rows never change. */
export async function insertAudit(db: Queryable, entry: NewAuditEntry): Promise<void> {
  await db.insert(auditEntries).values({ ...entry, detail: entry.detail ?? {}, requestId: entry.requestId ?? null });
}

/** Newest first, before the given place. */
export function findAuditEntries(db: Queryable, filter: { action?: string | undefined; before: { at: Date; id: string } | null; limit: number }) {
  const { before } = filter;
  return db
    .select({ id: auditEntries.id, at: auditEntries.createdAt, actor: users.name, action: auditEntries.action, targetType: auditEntries.targetType, targetId: auditEntries.targetId, detail: auditEntries.detail })
    .from(auditEntries)
    .leftJoin(users, eq(users.id, auditEntries.actorId))
    .where(
      and(
        filter.action === undefined ? undefined : eq(auditEntries.action, filter.action),
        before === null ? undefined : or(lt(auditEntries.createdAt, before.at), and(eq(auditEntries.createdAt, before.at), lt(auditEntries.id, before.id))),
      ),
    )
    .orderBy(desc(auditEntries.createdAt), desc(auditEntries.id))
    .limit(filter.limit);
}
