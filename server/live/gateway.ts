import type { Server as HttpServer } from 'node:http';
import { Server, type Namespace, type Socket } from 'socket.io';
import {
  benchCommandSchema,
  benchNamespace,
  handsCommandSchema,
  type CommandReply,
} from '@/lib/contracts/bench-command';
import type { Access } from '@/lib/access/access';
import { surface } from '@/lib/access/surface';
import { readHandshake, socketMay, type SocketVisitor } from '../auth/handshake';
import type { LiveStation } from './live-station';

export interface GatewayOptions {
  httpServer: HttpServer;
  stationByCode(code: string): LiveStation | null;
  log: { warn(details: object, message: string): void };
}

interface SocketData {
  visitor: SocketVisitor;
  station: LiveStation;
}
type BenchSocket = Socket<Events, Events, Record<never, never>, SocketData>;
// eslint-disable-next-line @typescript-eslint/no-explicit-any -- event payloads are parsed, not trusted
type Events = Record<string, (...args: any[]) => void>;
type Reply = (reply: CommandReply) => void;

const file = 'server/live/gateway.ts';

/** Notices a dead connection within three seconds, so that a lost bench is known after five. */
const heartbeat = { pingInterval: 1_000, pingTimeout: 2_000 };

/** Between browsers and stations: whole views out, commands in, both for whoever may. */
export class Gateway {
  private readonly io: Server;
  private readonly bench: Namespace<Events, Events, Record<never, never>, SocketData>;

  constructor(private readonly options: GatewayOptions) {
    this.io = new Server(options.httpServer, { serveClient: false, maxHttpBufferSize: 16_384, ...heartbeat });
    this.bench = this.io.of(benchNamespace);
    this.bench.use((socket, next) => {
      this.admit(socket).then(
        (refusal) => next(refusal ? new Error(refusal) : undefined),
        () => next(new Error('database-away')),
      );
    });
    this.bench.on('connection', (socket) => this.serve(socket));
  }

  /** To every screen of a station. Readings may be dropped for a slow one. */
  send(stationCode: string, event: 'view' | 'hands', payload: unknown): void {
    this.bench.to(stationCode).emit(event, payload);
  }

  sendReading(stationCode: string, payload: unknown): void {
    this.bench.to(stationCode).volatile.emit('reading', payload);
  }

  sessionIds(): string[] {
    return [...this.bench.sockets.values()].flatMap(({ data }) => data.visitor.actor?.sessionId ?? []);
  }

  /** Whoever came with this session or this enrolment is shown out. */
  disconnect(which: { sessionId?: string; enrolmentId?: string; station?: LiveStation }): void {
    for (const socket of this.bench.sockets.values()) {
      const { visitor, station } = socket.data;
      const meant =
        (which.sessionId !== undefined && visitor.actor?.sessionId === which.sessionId) ||
        (which.enrolmentId !== undefined && visitor.enrolment?.enrolmentId === which.enrolmentId) ||
        station === which.station;
      if (meant) socket.disconnect(true);
    }
  }

  /** Shows everyone out. The HTTP server is its owner's to close. */
  close(): void {
    this.io.disconnectSockets(true);
    this.io.engine.close();
  }

  /** The code of a refusal, or null. */
  private async admit(socket: BenchSocket): Promise<string | null> {
    const { headers, auth } = socket.handshake;
    const handshake = await readHandshake(headers);
    if (!handshake.ok) return handshake.code;
    const station = this.options.stationByCode(String(auth.station ?? ''));
    if (!station) return 'station-unknown';
    if (!socketMay('bench', handshake.visitor, station.row.id)) return 'not-allowed';
    socket.data = { visitor: handshake.visitor, station };
    return null;
  }

  private serve(socket: BenchSocket): void {
    const { station } = socket.data;
    void socket.join(station.row.code);
    this.takeRole(socket);
    socket.emit('view', station.station.view());
    if (station.hands) socket.emit('hands', station.hands.view());
    socket.on('command', (given: unknown, reply?: Reply) => {
      this.answer(socket, `${file}#command`, reply, async () => {
        const parsed = benchCommandSchema.safeParse(given);
        if (!parsed.success) return { ok: false, code: 'not-now' };
        // Stop is taken from every screen at the bench: whoever sees the danger may end it.
        if (parsed.data.kind !== 'stop' && !station.leadership.leads(socket.id))
          return { ok: false, code: 'screen-watches' };
        return station.station.command(parsed.data);
      });
    });
    socket.on('hands', (given: unknown, reply?: Reply) => {
      this.answer(socket, `${file}#hands`, reply, async () => {
        const parsed = handsCommandSchema.safeParse(given);
        return parsed.success ? station.handsCommand(parsed.data) : { ok: false, code: 'not-now' };
      });
    });
    socket.on('disconnect', () => station.leadership.leave(socket.id));
  }

  /** Only a browser that stands at this bench may lead it; everyone else watches. */
  private takeRole(socket: BenchSocket): void {
    const { station, visitor } = socket.data;
    if (!socketMay('enrolled-bench', visitor, station.row.id)) {
      socket.emit('role', { leads: false });
      return;
    }
    let heardMs = performance.now();
    socket.conn.on('packet', () => (heardMs = performance.now()));
    station.leadership.join({
      id: socket.id,
      joinedMs: heardMs,
      lastHeardMs: () => heardMs,
      tell: (role) => socket.emit('role', role),
    });
  }

  private answer(socket: BenchSocket, key: string, reply: Reply | undefined, act: () => Promise<CommandReply>): void {
    const { visitor, station } = socket.data;
    const access: Access | undefined = surface.events[key];
    const allowed = access !== undefined && socketMay(access, visitor, station.row.id);
    const answered = allowed ? act() : Promise.resolve<CommandReply>({ ok: false, code: 'not-permitted' });
    answered.then(
      (given) => reply?.(given),
      (error: unknown) => {
        this.options.log.warn({ error, station: station.row.code }, 'a command failed');
        reply?.({ ok: false, code: 'not-now' });
      },
    );
  }
}
