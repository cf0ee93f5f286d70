import { hash } from '@node-rs/argon2';
import type { Transaction } from '@/db/client';
import { accounts } from '@/db/schema/accounts';
import { trainings } from '@/db/schema/trainings';
import { printCode } from '@/lib/bench/scan-code';
import { demoAccounts, demoPassword } from './demo-accounts';
import { daysFrom } from './days';

/** Ids of the people that the rest of the demo is made, signed and released by. */
export interface SeededPeople {
  engineerId: string;
  secondEngineerId: string;
  qualityId: string;
  administratorId: string;
}

export async function seedPeople(tx: Transaction): Promise<SeededPeople> {
  const passwordHash = await hash(demoPassword);
  const rows = await Promise.all(
    demoAccounts.map(async (person) => ({
      name: person.name,
      email: person.email,
      operatorNumber: person.operatorNumber,
      badgeCode: person.badgeNumber && printCode('badge', person.badgeNumber),
      passwordHash: person.email && passwordHash,
      pinHash: person.pin && (await hash(person.pin)),
      roles: [...person.roles],
      locale: person.locale,
    })),
  );
  const made = await tx.insert(accounts).values(rows).returning({ id: accounts.id, name: accounts.name });
  const idOf = (name: string) => made.find((row) => row.name === name)!.id;
  return {
    engineerId: idOf('T. Marsden'),
    secondEngineerId: idOf('K. Osei'),
    qualityId: idOf('A. Boyle'),
    administratorId: idOf('R. Lindqvist'),
  };
}

export async function seedTrainings(
  tx: Transaction,
  people: SeededPeople,
  boardTypeIds: readonly string[],
  now: Date,
): Promise<void> {
  const trained = await tx.select({ id: accounts.id, name: accounts.name }).from(accounts);
  await tx.insert(trainings).values(
    demoAccounts.flatMap((person) => {
      if (person.trainedForDays === null) return [];
      const accountId = trained.find((row) => row.name === person.name)!.id;
      const validUntil = daysFrom(now, person.trainedForDays);
      return boardTypeIds.map((boardTypeId) => ({ accountId, boardTypeId, validUntil, recordedBy: people.qualityId }));
    }),
  );
}
