import { and, count, desc, eq, gte, lt, sql, type SQL } from 'drizzle-orm';
import type { Database } from '@/db/client';
import { accounts } from '@/db/schema/accounts';
import { trail } from '@/db/schema/trail';
import { trailCheckpoints } from '@/db/schema/trail-checkpoints';

export interface TrailQuestion {
  entity: string | null;
  accountId: string | null;
  since: Date | null;
  containing: string | null;
}

function matching({ entity, accountId, since, containing }: TrailQuestion): SQL | undefined {
  const pattern = containing && `%${containing.replace(/[\\%_]/g, (mark) => `\\${mark}`)}%`;
  const anywhere = sql`concat_ws(' ', ${trail.action}, ${trail.entityId}, ${trail.reason}, ${trail.before}::text, ${trail.after}::text)`;
  return and(
    entity ? eq(trail.entity, entity) : undefined,
    accountId ? eq(trail.accountId, accountId) : undefined,
    since ? gte(trail.at, since) : undefined,
    pattern ? sql`${anywhere} ilike ${pattern}` : undefined,
  );
}

/** Newest first, older than `before` where it is given. */
export async function listTrail(db: Database, question: TrailQuestion, before: number | null, most: number) {
  return db
    .select({ entry: trail, who: accounts.name })
    .from(trail)
    .leftJoin(accounts, eq(accounts.id, trail.accountId))
    .where(and(matching(question), before ? lt(trail.id, before) : undefined))
    .orderBy(desc(trail.id))
    .limit(most);
}

export async function countTrail(db: Database, question: TrailQuestion): Promise<number> {
  const [row] = await db.select({ n: count() }).from(trail).where(matching(question));
  return row!.n;
}

/** Everyone and every kind of thing that the trail names. */
export async function listTrailChoices(
  db: Database,
): Promise<{ people: { id: string; name: string }[]; entities: string[] }> {
  const people = await db
    .selectDistinct({ id: accounts.id, name: accounts.name })
    .from(accounts)
    .where(sql`exists (select from ${trail} where ${trail.accountId} = ${accounts.id})`)
    .orderBy(accounts.name);
  const entities = await db.selectDistinct({ entity: trail.entity }).from(trail).orderBy(trail.entity);
  return { people, entities: entities.map(({ entity }) => entity) };
}

/** Seals that were kept as heads of their chain, and when the newest was. */
export async function listKeptSeals(db: Database): Promise<{ seals: Set<string>; newest: Date | null }> {
  const rows = await db
    .select({ seal: trailCheckpoints.seal, writtenAt: trailCheckpoints.writtenAt })
    .from(trailCheckpoints)
    .orderBy(desc(trailCheckpoints.writtenAt))
    .limit(500);
  return { seals: new Set(rows.map(({ seal }) => seal)), newest: rows[0]?.writtenAt ?? null };
}
