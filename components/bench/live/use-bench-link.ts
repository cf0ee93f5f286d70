import { useEffect, useRef, useState } from 'react';
import type { BenchCommand, CommandReply, HandsCommand, HandsView } from '@/lib/contracts/bench-command';
import type { BenchView } from '@/lib/contracts/bench-view';
import type { FloodStore } from '../beep/flood-store';
import { heardBeep } from '../beep/heard-beep';
import { openBenchSocket, type BenchSocket } from './bench-socket';
import { createReadingStore, type ReadingStore } from './reading-store';

export interface BenchLink {
  view: BenchView | null;
  hands: HandsView | null;
  leads: boolean;
  lost: boolean;
  /** Why the station does not let this browser in; null while it does. */
  refusedCode: string | null;
  readings: ReadingStore;
  command: (command: BenchCommand) => Promise<CommandReply>;
  handsCommand: (command: HandsCommand) => Promise<CommandReply>;
}

const notYet: CommandReply = { ok: false, code: 'no-connection' };

/** The live connection of a bench screen. What was last seen stays in view when the connection is lost. */
export function useBenchLink(station: string, flood: FloodStore): BenchLink {
  const [view, setView] = useState<BenchView | null>(null);
  const [hands, setHands] = useState<HandsView | null>(null);
  const [leads, setLeads] = useState(true);
  const [lost, setLost] = useState(false);
  const [refusedCode, setRefused] = useState<string | null>(null);
  const [readings] = useState(createReadingStore);
  const socket = useRef<BenchSocket | null>(null);
  useEffect(() => {
    const open = openBenchSocket(station, {
      view: (next) => {
        // Before anything is rendered: the hand on the screw waits for this one.
        flood.hear(heardBeep(next));
        if (next.run?.supply.state !== 'on' && next.screen.kind !== 'commissioning') readings.push(null);
        setView(next);
      },
      reading: readings.push,
      hands: setHands,
      role: (role) => setLeads(role.leads),
      lost: setLost,
      refused: setRefused,
    });
    socket.current = open;
    return () => {
      socket.current = null;
      open.close();
    };
  }, [station, readings, flood]);
  return {
    view,
    hands,
    leads,
    lost,
    refusedCode,
    readings,
    command: (command) => socket.current?.command(command) ?? Promise.resolve(notYet),
    handsCommand: (command) => socket.current?.hands(command) ?? Promise.resolve(notYet),
  };
}
