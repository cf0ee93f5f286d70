import type { Role } from '@/lib/access/roles';

/** Invented people of an invented plant. Their passwords and PINs are known to everyone: never on a server that others reach. */
export interface DemoAccount {
  name: string;
  roles: readonly Role[];
  /** Null: works at benches only. */
  email: string | null;
  operatorNumber: string | null;
  /** What stands on the badge after the prefix. Null: no badge. */
  badgeNumber: string | null;
  pin: string | null;
  locale: string;
  /** Days from now until training for every demo board type ends; negative: it ended. Null: not trained. */
  trainedForDays: number | null;
}

export const demoPassword = 'gauge jaws demo';
/** Reserved by RFC 2606, so it is nobody's. */
export const demoMailDomain = 'haldonmere.example';

const operator = (over: Partial<DemoAccount> & Pick<DemoAccount, 'name' | 'operatorNumber' | 'badgeNumber' | 'pin'>) =>
  ({ roles: ['operator'], email: null, locale: 'en', trainedForDays: 240, ...over }) satisfies DemoAccount;

export const demoAccounts: readonly DemoAccount[] = [
  operator({ name: 'M. Adeyemi', operatorNumber: '14', badgeNumber: '4471', pin: '2580' }),
  operator({ name: 'P. Castellan', operatorNumber: '19', badgeNumber: '4502', pin: '3691' }),
  operator({ name: 'S. Novotna', operatorNumber: '22', badgeNumber: '4519', pin: '1470', locale: 'de' }),
  operator({ name: 'D. Whitlock', operatorNumber: '31', badgeNumber: '4560', pin: '8520', trainedForDays: 18 }),
  operator({ name: 'J. Okafor', operatorNumber: '33', badgeNumber: '4566', pin: '9630', trainedForDays: -11 }),
  {
    name: 'T. Marsden',
    roles: ['test-engineer'],
    email: `t.marsden@${demoMailDomain}`,
    operatorNumber: '4',
    badgeNumber: '4410',
    pin: '7319',
    locale: 'en',
    trainedForDays: 300,
  },
  {
    name: 'K. Osei',
    roles: ['test-engineer', 'operator'],
    email: `k.osei@${demoMailDomain}`,
    operatorNumber: '7',
    badgeNumber: '4417',
    pin: '6428',
    locale: 'en',
    trainedForDays: 300,
  },
  {
    name: 'A. Boyle',
    roles: ['quality-manager'],
    email: `a.boyle@${demoMailDomain}`,
    operatorNumber: null,
    badgeNumber: null,
    pin: null,
    locale: 'en',
    trainedForDays: null,
  },
  {
    name: 'R. Lindqvist',
    roles: ['administrator'],
    email: `r.lindqvist@${demoMailDomain}`,
    operatorNumber: null,
    badgeNumber: null,
    pin: null,
    locale: 'en',
    trainedForDays: null,
  },
];
