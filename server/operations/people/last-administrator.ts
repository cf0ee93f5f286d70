import { refusal } from '@/lib/contracts/outcome';

/** Whether `accountId` is the only one of these administrators. */
export function isLastOf(administrators: readonly string[], accountId: string): boolean {
  return administrators.length === 1 && administrators[0] === accountId;
}

export const lastAdministrator = refusal(
  'last-administrator',
  'This is the last administrator. Make another one first.',
);
