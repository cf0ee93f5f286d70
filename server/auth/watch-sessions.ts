import { endExpiredSessions, listOpenSessions } from '@/db/queries/sessions';
import { database, listen, type Listener } from '@/server/postgres';

/** Between looks at the database, for what no notification tells: expiry, and what was missed while the connection was away. */
const lookEveryMs = 30_000;

/**
 * Calls `onEnded` with each of the live sessions that ends, within moments of its end. Whoever holds sockets closes those of
 * the session. `liveSessionIds` are asked for at each look.
 */
export async function watchSessions(watch: {
  liveSessionIds: () => string[];
  onEnded: (sessionId: string) => void;
}): Promise<Listener> {
  async function look(): Promise<void> {
    await endExpiredSessions(database());
    const ids = watch.liveSessionIds();
    const open = new Set(await listOpenSessions(database(), ids));
    ids.filter((id) => !open.has(id)).forEach(watch.onEnded);
  }
  // The database being away ends nobody's session; the next look finds what was missed.
  const lookQuietly = () => void look().catch(() => {});
  const listener = await listen(
    'session_ended',
    (id) => {
      if (watch.liveSessionIds().includes(id)) watch.onEnded(id);
    },
    lookQuietly,
  );
  const timer = setInterval(lookQuietly, lookEveryMs);
  timer.unref();
  return {
    async close() {
      clearInterval(timer);
      await listener.close();
    },
  };
}
