import type { Database } from '@/db/client';
import type { ObjectStore } from '@/server/files/storage/object-store';
import { lastCheckpointAt, writeCheckpoints } from './write-checkpoints';

export interface TrailKeeper {
  stop(): Promise<void>;
}

interface TrailKeeperOptions {
  db: Database;
  store: ObjectStore | null;
  log: { warn(details: object, message: string): void };
}

const lookEveryMs = 10 * 60_000;
const keepEveryMs = 24 * 3_600_000;

/** Keeps the heads of the trail's chains once a day, for as long as the server runs; what fails is tried again at the next look. */
export function startTrailKeeper({ db, store, log }: TrailKeeperOptions): TrailKeeper {
  let looking: Promise<void> = Promise.resolve();
  async function look(): Promise<void> {
    const last = await lastCheckpointAt(db);
    if (!last || Date.now() - last.getTime() >= keepEveryMs) await writeCheckpoints(db, store);
  }
  const begin = () => {
    looking = look().catch((err: unknown) => log.warn({ err }, 'heads of the trail not kept'));
  };
  begin();
  const timer = setInterval(begin, lookEveryMs);
  timer.unref();
  return {
    async stop() {
      clearInterval(timer);
      await looking;
    },
  };
}
