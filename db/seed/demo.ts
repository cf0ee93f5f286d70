import { and, eq, isNull, like, or } from 'drizzle-orm';
import type { Database } from '@/db/client';
import { insertTrail } from '@/db/queries/trail';
import { accounts } from '@/db/schema/accounts';
import { printCode } from '@/lib/bench/scan-code';
import { seedBenches } from './benches';
import { seedLots } from './boxes';
import { seedFinishedLot } from './finished-lot';
import { demoAccounts, demoMailDomain } from './demo-accounts';
import { seedPeople, seedTrainings } from './people';
import { seedProducts } from './products';
import { seedReasonCodes } from './reason-codes';

/** Whether nobody has an account yet: nothing was seeded and no administrator made. */
export async function isEmpty(db: Database): Promise<boolean> {
  return (await db.$count(accounts)) === 0;
}

/** Whether accounts with known passwords or PINs still work here. */
export async function hasDemoAccounts(db: Database): Promise<boolean> {
  const byBadge = demoAccounts.map(({ name, badgeNumber }) =>
    and(eq(accounts.name, name), eq(accounts.badgeCode, printCode('badge', badgeNumber ?? ''))),
  );
  const known = or(like(accounts.email, `%@${demoMailDomain}`), ...byBadge);
  return (await db.$count(accounts, and(known, isNull(accounts.disabledAt)))) > 0;
}

/** Fills an empty database with the demo: all of it or nothing. Says whether it did. */
export async function seedDemo(db: Database, now = new Date()): Promise<boolean> {
  return db.transaction(async (tx) => {
    // Two servers starting at once seed one after the other.
    await tx.execute('select pg_advisory_xact_lock(5710413)');
    if ((await tx.$count(accounts)) > 0) return false;
    const people = await seedPeople(tx);
    const products = await seedProducts(tx, people, now);
    await seedTrainings(tx, people, Object.values(products.boardTypeIds), now);
    await seedBenches(tx, people, products, now);
    await seedLots(tx, people, products, now);
    await seedFinishedLot(tx, people, products, now);
    await seedReasonCodes(tx, people, now);
    await insertTrail(tx, null, { action: 'demo.seeded', entity: 'database', entityId: 'demo' });
    return true;
  });
}
