import type { Role } from './roles';

/** What desk pages call the roles, and in a few words what each may do. */
export const roleWords: Record<Role, { name: string; may: string }> = {
  operator: { name: 'Operator', may: 'test boards, print a label again, call an engineer' },
  'test-engineer': { name: 'Test engineer', may: 'board types, sequences, commissioning, instruments, studies' },
  'quality-manager': { name: 'Quality', may: 'lots, holds, dispositions, retests, certificates, the trail' },
  administrator: { name: 'Administrator', may: 'people, badges, stations, printers. Signs nothing' },
};
