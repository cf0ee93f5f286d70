import { Client } from 'pg';
import { sharedDatabase, type Database } from '@/db/client';
import { environment } from './environment';

/** The program's database, one pool a process. */
export function database(): Database {
  return sharedDatabase(environment().databaseUrl).db;
}

/** Whether PostgreSQL answers within three seconds. */
export async function databaseAnswers(): Promise<boolean> {
  try {
    await sharedDatabase(environment().databaseUrl).pool.query('select 1');
    return true;
  } catch {
    return false;
  }
}

export interface Listener {
  close(): Promise<void>;
}

/**
 * Hears notifications on `channel` until closed, on a connection of its own. A lost connection is made again, with waits
 * growing to 2 s; `onReconnected` then runs, since notifications sent meanwhile are lost and what they said must be looked up.
 */
export async function listen(
  channel: string,
  onMessage: (payload: string) => void,
  onReconnected: () => void = () => {},
  url = environment().databaseUrl,
): Promise<Listener> {
  let closed = false;
  let client: Client | null = null;
  let timer: NodeJS.Timeout | undefined;

  async function connect(): Promise<void> {
    const next = new Client({ connectionString: url, connectionTimeoutMillis: 3_000, keepAlive: true });
    next.on('notification', (message) => onMessage(message.payload ?? ''));
    next.on('error', () => {});
    next.on('end', () => {
      if (client === next) client = null;
      if (!closed) retry(50);
    });
    await next.connect();
    await next.query(`listen ${next.escapeIdentifier(channel)}`);
    client = next;
  }

  function retry(waitMs: number): void {
    clearTimeout(timer);
    timer = setTimeout(() => {
      if (closed) return;
      connect().then(onReconnected, () => retry(Math.min(waitMs * 2, 2_000)));
    }, waitMs);
    timer.unref();
  }

  await connect();
  return {
    async close() {
      closed = true;
      clearTimeout(timer);
      await client?.end();
    },
  };
}
