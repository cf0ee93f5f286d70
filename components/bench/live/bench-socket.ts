import { io, type Socket } from 'socket.io-client';
import {
  benchNamespace,
  type BenchCommand,
  type CommandReply,
  type HandsCommand,
  type HandsView,
  type ScreenRole,
} from '@/lib/contracts/bench-command';
import type { BenchReading, BenchView } from '@/lib/contracts/bench-view';

/** Milliseconds. A command that is not answered in time is told as not done; nothing is sent later on its own. */
export const linkTiming = { staleMs: 2000, replyMs: 4000, retryMs: 1500, lookMs: 250 } as const;

export interface BenchEvents {
  view: (view: BenchView) => void;
  reading: (reading: BenchReading) => void;
  hands: (hands: HandsView) => void;
  role: (role: ScreenRole) => void;
  /** Heard within `staleMs`, or not; told when it changes. */
  lost: (lost: boolean) => void;
  /** Code of a refused handshake, null once let in. */
  refused: (code: string | null) => void;
}

export interface BenchSocket {
  command: (command: BenchCommand) => Promise<CommandReply>;
  hands: (command: HandsCommand) => Promise<CommandReply>;
  close: () => void;
}

/** Connects to a station for as long as it is open, through every loss of the connection. */
export function openBenchSocket(station: string, events: BenchEvents): BenchSocket {
  const socket: Socket = io(benchNamespace, {
    auth: { station },
    reconnectionDelay: 300,
    reconnectionDelayMax: linkTiming.retryMs,
    transports: ['websocket', 'polling'],
  });
  let revision = -Infinity;
  let heardAt = performance.now();
  let lost = false;
  let retry: ReturnType<typeof setTimeout> | undefined;
  const heard = () => {
    heardAt = performance.now();
  };
  const again = () => {
    clearTimeout(retry);
    retry = setTimeout(() => socket.connect(), linkTiming.retryMs);
  };

  socket.on('connect', () => {
    // A restarted server counts its views from the beginning.
    revision = -Infinity;
    heard();
    socket.io.engine.on('packet', heard);
    events.refused(null);
  });
  socket.on('connect_error', (error) => {
    // A refused handshake is not tried again by the library; whatever it says is tried again here.
    if (socket.active) return;
    events.refused(error.message);
    again();
  });
  socket.on('disconnect', () => {
    if (!socket.active) again();
  });
  socket.on('view', (view: BenchView) => {
    if (view.revision <= revision) return;
    revision = view.revision;
    events.view(view);
  });
  socket.on('reading', events.reading);
  socket.on('hands', events.hands);
  socket.on('role', events.role);

  const watch = setInterval(() => {
    const stale = performance.now() - heardAt > linkTiming.staleMs;
    if (stale === lost) return;
    lost = stale;
    events.lost(lost);
  }, linkTiming.lookMs);

  const ask = async (event: 'command' | 'hands', payload: BenchCommand | HandsCommand): Promise<CommandReply> => {
    // The library would keep it and send it after a reconnection, when nobody expects it any more.
    if (!socket.connected) return { ok: false, code: 'no-connection' };
    try {
      return (await socket.timeout(linkTiming.replyMs).emitWithAck(event, payload)) as CommandReply;
    } catch {
      return { ok: false, code: 'no-connection' };
    }
  };
  return {
    command: (command) => ask('command', command),
    hands: (command) => ask('hands', command),
    close: () => {
      clearInterval(watch);
      clearTimeout(retry);
      socket.close();
    },
  };
}
