import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { io, type Socket } from 'socket.io-client';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { decideAccess } from '@/lib/access/access';
import { surface } from '@/lib/access/surface';
import { benchNamespace, type CommandReply } from '@/lib/contracts/bench-command';
import { signOutSession } from '@/server/operations/people/sign-out-session';
import { sessionIdOf } from '@/server/auth/read-session';
import { watchSessions } from '@/server/auth/watch-sessions';
import { Gateway } from '@/server/live/gateway';
import type { LiveStation } from '@/server/live/live-station';
import { insertStation } from '../database/records';
import { temporaryDatabase, type TemporaryDatabase } from '../database/temporary-postgres';
import { makeVisitors, type TestVisitors } from './visitors';

const origin = 'http://127.0.0.1:3000';

let open: TemporaryDatabase;
let made: TestVisitors;
let otherCode: string;
let server: Server;
let gateway: Gateway;
/** Events that reached a station, past every check. */
const reached: string[] = [];

/** A station that takes everything, so that only the gateway can refuse. */
function willingStation(row: { id: string; code: string }): LiveStation {
  const take = (event: string) => async (): Promise<CommandReply> => {
    reached.push(event);
    return { ok: true };
  };
  return {
    row,
    station: { view: () => ({}), command: take('command') },
    hands: { view: () => ({}) },
    handsCommand: take('hands'),
    leadership: { leads: () => true, join: () => {}, leave: () => {} },
  } as unknown as LiveStation;
}

beforeAll(async () => {
  open = await temporaryDatabase();
  made = await makeVisitors(open.db);
  const other = await insertStation(open.db);
  otherCode = other.code;
  const stations = [made.station, other].map(willingStation);
  server = createServer();
  gateway = new Gateway({
    httpServer: server,
    stationByCode: (code) => stations.find((station) => station.row.code === code) ?? null,
    log: { warn: () => {} },
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
});
afterAll(async () => {
  await gateway.close();
  await open.close();
});

/** A connected socket, or the code with which the handshake was refused. */
async function connect(
  cookies: Record<string, string>,
  station: string,
  from: string | undefined = origin,
): Promise<Socket | string> {
  const cookie = Object.entries(cookies)
    .map(([name, value]) => `${name}=${value}`)
    .join('; ');
  const socket = io(`http://127.0.0.1:${(server.address() as AddressInfo).port}${benchNamespace}`, {
    transports: ['websocket'],
    reconnection: false,
    forceNew: true,
    auth: { station },
    extraHeaders: { cookie, ...(from === undefined ? {} : { origin: from }) },
  });
  return new Promise((resolve) => {
    socket.once('connect', () => resolve(socket));
    socket.once('connect_error', (error) => {
      socket.close();
      resolve(error.message);
    });
  });
}

const payloads: Record<string, unknown> = { command: { kind: 'stop' }, hands: { kind: 'remove-board' } };

describe('each socket event asks for the access it is listed with', () => {
  test.each(Object.entries(surface.events))('%s: %s', async (key, access) => {
    const event = key.split('#')[1]!;
    expect(payloads, 'a payload for this event').toHaveProperty(event);
    for (const { name, visitor, cookies } of made.visitors) {
      const socket = await connect(await cookies(), made.station.code);
      if (typeof socket === 'string') {
        expect({ name, socket }).toEqual({ name, socket: decideAccess('bench', visitor) });
        continue;
      }
      reached.length = 0;
      const reply = (await socket.timeout(5_000).emitWithAck(event, payloads[event])) as CommandReply;
      socket.close();
      const allowed = decideAccess(access, visitor) === 'allowed';
      expect({ name, reply }).toEqual({ name, reply: allowed ? { ok: true } : { ok: false, code: 'not-permitted' } });
      expect({ name, reached }).toEqual({ name, reached: allowed ? [event] : [] });
    }
  });
});

describe('a handshake', () => {
  test('is refused from another site, without an origin, and to nobody', async () => {
    const enrolled = await made.visitors.find(({ visitor }) => visitor.enrolledBench)!.cookies();
    expect(await connect(enrolled, made.station.code, 'http://elsewhere.example')).toBe('wrong-origin');
    expect(await connect(enrolled, made.station.code, '')).toBe('wrong-origin');
    expect(await connect({}, made.station.code)).toBe('sign-in');
  });

  test('takes a browser enrolled at one bench for no other', async () => {
    const enrolled = await made.visitors.find(({ visitor }) => visitor.enrolledBench)!.cookies();
    expect(await connect(enrolled, otherCode)).toBe('not-allowed');
  });
});

test('a socket is shown out within 5 s of the end of its session', async () => {
  const cookies = await made.visitors.find(({ name }) => name === 'test-engineer')!.cookies();
  const socket = await connect(cookies, made.station.code);
  if (typeof socket === 'string') throw new Error(socket);
  const watch = await watchSessions({
    liveSessionIds: () => gateway.sessionIds(),
    onEnded: (sessionId) => gateway.disconnect({ sessionId }),
  });
  try {
    const out = new Promise<string>((resolve) => socket.once('disconnect', resolve));
    const startedMs = performance.now();
    await signOutSession((await sessionIdOf(cookies))!);
    expect(await out).toBe('io server disconnect');
    expect(performance.now() - startedMs).toBeLessThan(5_000);
    expect(await connect(cookies, made.station.code)).toBe('sign-in');
  } finally {
    await watch.close();
    socket.close();
  }
});
