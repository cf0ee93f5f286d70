/** The four roles of the trade; an account may hold several. What each may do stands in permissions.ts. */
export const roles = ['operator', 'test-engineer', 'quality-manager', 'administrator'] as const;
export type Role = (typeof roles)[number];
