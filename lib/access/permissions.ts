import type { Role } from './roles';

/** Who may do what: the one table. Every page, action, handler and socket event names a right from here. */
export const permissions = {
  /** Sign in at a bench at all; which runs are allowed there is a right of its own. */
  'use-bench': ['operator', 'test-engineer'],
  /** Run, stop, print a label again, enter a serial by hand, call an engineer. */
  'test-boards': ['operator'],

  /** One more label of a board that passed, from a desk. */
  'print-labels': ['operator', 'test-engineer', 'quality-manager'],

  'edit-board-types': ['test-engineer'],
  'edit-sequences': ['test-engineer'],
  /** Another engineer, or quality; never the maker. */
  'release-sequences': ['test-engineer', 'quality-manager'],
  'commission-stations': ['test-engineer'],
  'manage-instruments': ['test-engineer'],
  'set-daily-check': ['test-engineer'],
  'run-studies': ['test-engineer'],
  'make-engineering-runs': ['test-engineer'],
  'acknowledge-calls': ['test-engineer'],
  'record-training': ['test-engineer', 'quality-manager'],

  'manage-lots': ['quality-manager'],
  'hold-lots': ['quality-manager'],
  'sign-dispositions': ['quality-manager'],
  /** A concession needs quality and an engineer: two signatures by two people. */
  'sign-concessions': ['quality-manager', 'test-engineer'],
  'order-retests': ['quality-manager'],
  'manage-reason-codes': ['quality-manager'],
  'issue-certificates': ['quality-manager'],
  'approve-limits': ['quality-manager'],
  'read-trail': ['quality-manager'],

  'manage-accounts': ['administrator'],
  'manage-stations': ['administrator'],
  'manage-printers': ['administrator'],
  'manage-mail': ['administrator'],
  'manage-tokens': ['administrator'],
} as const satisfies Record<string, readonly Role[]>;

export type Right = keyof typeof permissions;
export const rights = Object.keys(permissions) as Right[];

/** Whether any of the roles gives the right. */
export function mayDo(roles: readonly Role[], right: Right): boolean {
  return (permissions[right] as readonly Role[]).some((role) => roles.includes(role));
}
