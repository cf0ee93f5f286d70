import { demoAccounts, demoPassword } from '@/db/seed/demo-accounts';
import { hasDemoAccounts, isEmpty, seedDemo } from '@/db/seed/demo';
import type { Environment } from './environment';
import { firstAdministratorLink } from './operations/people/first-administrator';
import { database } from './postgres';

function demoLines(url: string): string[] {
  const desk = demoAccounts.filter((account) => account.email);
  const bench = demoAccounts.filter((account) => account.badgeNumber);
  return [
    'Demo accounts, for this computer only.',
    '',
    `  At the desk, password "${demoPassword}":`,
    ...desk.map((account) => `    ${(account.email ?? '').padEnd(34)} ${account.name}, ${account.roles.join(', ')}`),
    '',
    `  At the bench, ${url}/bench:`,
    ...bench.map(
      (account) =>
        `    badge ${account.badgeNumber}, PIN ${account.pin}   ${account.name}, ${account.roles.join(', ')}`,
    ),
  ];
}

/**
 * Seeds the demo into an empty demo database and says what to print once the server listens: the address, and the demo accounts
 * or the link that makes the first administrator. Refuses demo accounts beyond loopback by throwing.
 */
export async function welcome(settings: Environment): Promise<string> {
  const db = database();
  if (settings.demo && (await isEmpty(db))) {
    console.log('  Seeding the demo …');
    await seedDemo(db);
  }
  const demo = await hasDemoAccounts(db);
  if (demo && !settings.loopback)
    throw new Error('This database holds demo accounts with known passwords. Disable them before others can reach it.');
  const link = await firstAdministratorLink();
  return [
    '',
    `Sillwright is at ${settings.publicUrl}`,
    '',
    ...(demo && settings.demo ? demoLines(settings.publicUrl) : []),
    ...(link ? [`Make the first administrator, once, within a day: ${link}`] : []),
    '',
  ].join('\n');
}
