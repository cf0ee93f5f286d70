import type { Role } from '../access/roles';

/** A concession is signed by quality and by an engineer, who are two people. */
export const concessionSides = ['quality', 'engineering'] as const;
export type ConcessionSide = (typeof concessionSides)[number];

const roleOf: Record<ConcessionSide, Role> = { quality: 'quality-manager', engineering: 'test-engineer' };

/** The sides that somebody can sign for. */
export function sidesOf(roles: readonly Role[]): ConcessionSide[] {
  return concessionSides.filter((side) => roles.includes(roleOf[side]));
}

/** Why `second` cannot sign beside `first`; null when both sides are then signed for by two people. */
export function secondSignerProblem(
  first: { accountId: string; sides: readonly ConcessionSide[] },
  second: { accountId: string; sides: readonly ConcessionSide[] },
): 'same-person' | 'same-side' | null {
  if (first.accountId === second.accountId) return 'same-person';
  const both = first.sides.some((one) => second.sides.some((other) => other !== one));
  return both ? null : 'same-side';
}
