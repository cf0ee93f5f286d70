import { endSession, type EndedBecause } from '@/db/queries/sessions';
import { database } from '@/server/postgres';

/** Ends a session; its pages and sockets end with it. Ending it again changes nothing. */
export async function signOutSession(sessionId: string, because: EndedBecause = 'signed-out'): Promise<void> {
  await endSession(database(), sessionId, because);
}
