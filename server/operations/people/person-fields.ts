import { isUniqueViolation } from '@/db/errors';
import type { Account } from '@/db/queries/accounts';
import { printCode } from '@/lib/bench/scan-code';
import type { AddPerson } from '@/lib/contracts/people';
import { refusal, type Refusal } from '@/lib/contracts/outcome';

/** Columns of an account that the form of a person fills. */
export function accountFieldsOf(form: AddPerson) {
  return {
    name: form.name,
    email: form.email,
    operatorNumber: form.operatorNumber,
    badgeCode: form.badgeNumber === null ? null : printCode('badge', form.badgeNumber),
    roles: form.roles,
    locale: form.locale,
  };
}

/** What the trail keeps of an account: never a secret or its hash. */
export function trailFieldsOf(account: Account) {
  const { name, email, operatorNumber, badgeCode, roles, locale, disabledAt } = account;
  return { name, email, operatorNumber, badgeCode, roles, locale, disabledAt };
}

/** A bench needs badge and number, a desk an address: an account that could sign in nowhere is refused. */
export function fieldsProblem(form: AddPerson): Refusal | null {
  const atBench = form.roles.includes('operator');
  if (atBench && !form.badgeNumber)
    return refusal('badge-missing', 'An operator signs in by badge. Give the badge number.', 'badgeNumber');
  if (atBench && !form.operatorNumber)
    return refusal('number-missing', 'Give the number by which benches show an operator.', 'operatorNumber');
  if (!form.email && !atBench)
    return refusal('email-missing', 'Work at a desk needs an e-mail address to sign in.', 'email');
  return null;
}

/** The refusal for a value that another account holds, or null when the error says something else. */
export function takenRefusal(error: unknown): Refusal | null {
  if (isUniqueViolation(error, 'accounts_email_unique'))
    return refusal('email-taken', 'Another account has this e-mail address.', 'email');
  if (isUniqueViolation(error, 'accounts_badgeCode_unique'))
    return refusal('badge-taken', 'Another account has this badge.', 'badgeNumber');
  if (isUniqueViolation(error, 'accounts_operatorNumber_unique'))
    return refusal('number-taken', 'Another account has this number.', 'operatorNumber');
  return null;
}
