'use server';

import { authorise } from '@/server/auth/authorise';
import { verifyWholeTrail } from '@/server/operations/trail/verify-whole-trail';

export async function verifyTrailAction() {
  await authorise('read-trail');
  return verifyWholeTrail();
}
