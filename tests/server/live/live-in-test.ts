import { mkdtemp, rm } from 'node:fs/promises';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import pino from 'pino';
import { eq } from 'drizzle-orm';
import { seedDemo } from '@/db/seed/demo';
import { accounts } from '@/db/schema/accounts';
import { stationEnrolments } from '@/db/schema/station-enrolments';
import { stations } from '@/db/schema/stations';
import { hashToken, makeToken } from '@/server/auth/secret-hash';
import { enrolmentCookie } from '@/server/auth/enrolment-cookie';
import { startLive, type Live } from '@/server/live/start-live';
import { temporaryDatabase, type TemporaryDatabase } from '../../database/temporary-postgres';
import { ScreenInTest } from './screen-in-test';

export interface LiveInTest {
  open: TemporaryDatabase;
  url: string;
  dataFolder: string;
  /** Starts the stations and the gateway, as after a start of the server. */
  start(): Promise<Live>;
  /** Lets another process listen where this one did. */
  freePort(): Promise<void>;
  enrol(stationCode: string): Promise<string>;
  screen(stationCode: string, cookie: string, origin?: string): Promise<ScreenInTest>;
  close(): Promise<void>;
}

/** The demo in a temporary database with a real HTTP server in front; simulated stations run `clockRate` times real time. */
export async function liveInTest(clockRate: number): Promise<LiveInTest> {
  const open = await temporaryDatabase();
  await seedDemo(open.db);
  const dataFolder = await mkdtemp(join(tmpdir(), 'sillwright-live-'));
  let httpServer = createServer((_, response) => response.end());
  await new Promise<void>((resolve) => httpServer.listen(0, '127.0.0.1', resolve));
  const { port } = httpServer.address() as AddressInfo;
  Object.assign(process.env, {
    PORT: String(port),
    SILLWRIGHT_CLOCK_RATE: String(clockRate),
    SILLWRIGHT_DATA: dataFolder,
  });
  const url = `http://127.0.0.1:${port}`;
  const screens: ScreenInTest[] = [];
  let live: Live | null = null;
  return {
    open,
    url,
    dataFolder,
    async start() {
      if (live || !httpServer.listening) {
        httpServer.closeAllConnections();
        if (httpServer.listening) await new Promise((resolve) => httpServer.close(resolve));
        httpServer = createServer((_, response) => response.end());
        await new Promise<void>((resolve) => httpServer.listen(port, '127.0.0.1', resolve));
      }
      return (live = await startLive({ httpServer, log: pino({ level: process.env.LOG_LEVEL ?? 'silent' }) }));
    },
    async freePort() {
      await new Promise((resolve) => httpServer.close(resolve));
    },
    async enrol(stationCode) {
      const token = makeToken();
      const [station] = await open.db.select().from(stations).where(eq(stations.code, stationCode));
      const [admin] = await open.db.select().from(accounts).limit(1);
      await open.db
        .insert(stationEnrolments)
        .values({ stationId: station!.id, tokenHash: hashToken(token), enrolledBy: admin!.id });
      return `${enrolmentCookie}=${token}`;
    },
    async screen(stationCode, cookie, origin = url) {
      const screen = new ScreenInTest(url, stationCode, cookie, origin);
      screens.push(screen);
      await screen.connected();
      return screen;
    },
    async close() {
      screens.forEach((screen) => screen.close());
      await live?.stop();
      httpServer.close();
      httpServer.closeAllConnections();
      await open.close();
      await rm(dataFolder, { recursive: true, force: true });
    },
  };
}
