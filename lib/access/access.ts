import { mayDo, type Right } from './permissions';
import type { Role } from './roles';

/**
 * Who may reach something.
 * - `public`: anyone, before signing in
 * - `signed-in`: every working account at a desk
 * - `bench`: a browser enrolled at a bench, or a desk account, which watches
 * - `enrolled-bench`: a browser enrolled at a bench and nothing else
 * - a right: a desk account whose roles give it
 */
export type Access = 'public' | 'signed-in' | 'bench' | 'enrolled-bench' | Right;

/** Whoever asks. `roles` is null when nobody is signed in. */
export interface Visitor {
  roles: readonly Role[] | null;
  enrolledBench: boolean;
}

export type AccessDecision = 'allowed' | 'sign-in' | 'not-allowed';

export function decideAccess(access: Access, { roles, enrolledBench }: Visitor): AccessDecision {
  if (access === 'public') return 'allowed';
  if (access === 'enrolled-bench') return enrolledBench ? 'allowed' : 'not-allowed';
  if (access === 'bench' && enrolledBench) return 'allowed';
  if (!roles) return 'sign-in';
  if (access === 'bench' || access === 'signed-in') return 'allowed';
  return mayDo(roles, access) ? 'allowed' : 'not-allowed';
}
