import { io, type Socket } from 'socket.io-client';
import type { BenchCommand, CommandReply, HandsCommand, HandsView } from '@/lib/contracts/bench-command';
import type { BenchView } from '@/lib/contracts/bench-view';

/** A bench screen without a browser: a socket, the newest view, and a person who does what it says. */
export class ScreenInTest {
  readonly socket: Socket;
  view: BenchView | null = null;
  hands: HandsView | null = null;
  leads: boolean | null = null;
  readings = 0;
  /** Whether the person obeys the screen of a run by itself. */
  obedient = true;
  private readonly watchers = new Set<() => void>();
  private lastKey = '';

  constructor(url: string, station: string, cookie: string, origin: string) {
    this.socket = io(`${url}/bench`, {
      auth: { station },
      extraHeaders: { origin, cookie },
      transports: ['websocket'],
      reconnection: false,
      forceNew: true,
    });
    this.socket.on('view', (view: BenchView) => {
      if (this.view && view.revision < this.view.revision) return;
      this.view = view;
      this.changed();
    });
    this.socket.on('hands', (hands: HandsView) => {
      this.hands = hands;
      this.changed();
    });
    this.socket.on('role', ({ leads }: { leads: boolean }) => {
      this.leads = leads;
      this.changed();
    });
    this.socket.on('reading', () => this.readings++);
    this.socket.on('disconnect', () => this.changed());
  }

  connected(): Promise<void> {
    return new Promise((resolve, reject) => {
      this.socket.once('connect_error', reject);
      this.socket.once(
        'connect',
        () => void this.until(() => this.view !== null && this.leads !== null).then(() => resolve()),
      );
    });
  }

  command(command: BenchCommand): Promise<CommandReply> {
    return this.socket.timeout(30_000).emitWithAck('command', command);
  }

  scan(text: string): Promise<CommandReply> {
    return this.command({ kind: 'scan', text });
  }

  act(command: HandsCommand): Promise<CommandReply> {
    return this.socket.timeout(120_000).emitWithAck('hands', command);
  }

  async until(fits: (screen: ScreenInTest) => boolean, withinMs = 60_000): Promise<BenchView> {
    await new Promise<void>((resolve, reject) => {
      const timer = setTimeout(() => {
        this.watchers.delete(look);
        reject(new Error(`Not seen within ${withinMs} ms: ${JSON.stringify(this.view)}`));
      }, withinMs);
      const look = () => {
        if (!fits(this)) return;
        clearTimeout(timer);
        this.watchers.delete(look);
        resolve();
      };
      this.watchers.add(look);
      look();
    });
    return this.view!;
  }

  /** Badge, PIN and the sheet of a lot; on a station without a controller the fixture is empty, says the person. */
  async beginShift(badge: string, pin: string, lotCode: string): Promise<void> {
    await this.until(({ view }) => view?.screen.kind === 'badge');
    await this.scan(`SWB-${badge}`);
    await this.command({ kind: 'pin', digits: pin });
    await this.scan(`SWL-${lotCode}`);
    await this.until(({ view }) => view?.lot?.code === lotCode);
  }

  /** One board from the box through a whole run. Returns its serial once the run is over. */
  async testNextBoard(): Promise<string> {
    await this.act({ kind: 'lid', closed: false });
    if (this.hands?.boardSerial) {
      const removed = await this.act({ kind: 'remove-board' });
      if (!removed.ok) throw new Error(`remove-board: ${removed.code}`);
      await this.until(({ hands }) => hands?.boardSerial === null);
      // As long as a hand takes: the controller has to see the fixture empty meanwhile.
      await new Promise((resolve) => setTimeout(resolve, 200));
    }
    await this.until(({ view }) => view?.screen.kind === 'idle' || view?.screen.kind === 'run');
    await this.until(({ hands }) => hands?.nextSerial !== null);
    const placed = await this.act({ kind: 'place-board' });
    if (!placed.ok) throw new Error(`place-board: ${placed.code}`);
    await this.until(({ hands }) => hands?.boardSerial !== null);
    const serial = this.hands!.boardSerial!;
    const reply = await this.scan(serial);
    if (!reply.ok) throw new Error(`${serial}: ${JSON.stringify(reply)}`);
    await this.runOver(serial);
    return serial;
  }

  /** Seen on the screen and, for a reject, waiting for its bin. */
  runOver(serial: string): Promise<BenchView> {
    return this.until(({ view }) => {
      if (view?.run?.serial !== serial) return false;
      const { screen, supply } = view.run;
      if (screen.kind === 'reject') return view.screen.kind === 'bin' || view.engineering !== null;
      return screen.kind === 'pass' || (screen.kind === 'no-verdict' && supply.state !== 'on');
    }, 120_000);
  }

  close(): void {
    this.socket.close();
  }

  private changed(): void {
    this.watchers.forEach((look) => look());
    const screen = this.view?.screen.kind === 'run' ? this.view.run?.screen : undefined;
    const key = JSON.stringify([
      this.view?.run?.serial,
      this.view?.run?.attempt,
      screen?.kind,
      screen && 'wants' in screen ? screen.wants : null,
      screen?.kind === 'trim'
        ? [screen.trim.stage, screen.trim.direction, screen.trim.round, screen.trim.finding]
        : null,
    ]);
    if (key === this.lastKey || !this.obedient || !this.leads) return;
    this.lastKey = key;
    if (screen) void this.obey(screen).catch(() => undefined);
  }

  private async obey(screen: NonNullable<BenchView['run']>['screen']): Promise<void> {
    if (screen.kind === 'seat' && (screen.wants === 'close-lid' || screen.wants === 'confirm-lid-and-board')) {
      await this.act({ kind: 'lid', closed: true });
      if (screen.wants === 'confirm-lid-and-board') await this.command({ kind: 'confirm', what: 'lid-and-board' });
    }
    if (screen.kind === 'seal' && screen.wants === 'open-lid') {
      await this.act({ kind: 'lid', closed: false });
      await this.command({ kind: 'confirm', what: 'lid-open' });
    }
    if (screen.kind === 'seal' && screen.wants === 'seal-screw')
      await this.command({ kind: 'confirm', what: 'sealed' });
    if (screen.kind === 'seal' && screen.wants === 'close-lid') {
      await this.act({ kind: 'lid', closed: true });
      await this.command({ kind: 'confirm', what: 'lid-closed' });
    }
    if (screen.kind === 'instruction') await this.command({ kind: 'confirm', what: 'instruction-done' });
    if (screen.kind === 'operator-check') await this.command({ kind: 'answer', ok: true });
    if (screen.kind === 'trim' && ['beep-1', 'beep-2', 'turn'].includes(screen.trim.stage)) {
      if (screen.trim.finding === 'no-effect') await this.command({ kind: 'will-not-turn' });
      else await this.act({ kind: 'turn-as-prompted' });
    }
  }
}
