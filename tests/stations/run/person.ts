import type { BenchCommand } from '@/lib/contracts/bench-command';
import type { BenchView } from '@/lib/contracts/bench-view';
import type { Clock } from '@/stations/clock/clock';
import type { SimulatedFixture } from '@/stations/simulation/simulated-fixture';

/** An operator who does what the screen says, with human delays, on the station's own clock. */
export class Person {
  private lastKey = '';

  constructor(
    private readonly clock: Clock,
    private readonly fixture: SimulatedFixture,
    private readonly send: (command: BenchCommand) => void,
    /** Overrides: return true to have handled the screen. */
    private readonly instead: (view: BenchView) => boolean = () => false,
  ) {}

  see(view: BenchView): void {
    const screen = view.screen.kind === 'run' ? view.run?.screen : undefined;
    const key = JSON.stringify([
      view.screen.kind,
      screen?.kind,
      screen && 'wants' in screen ? screen.wants : null,
      screen?.kind === 'trim' ? [screen.trim.stage, screen.trim.direction, screen.trim.round] : null,
    ]);
    if (key === this.lastKey) return;
    this.lastKey = key;
    if (this.instead(view) || !screen) return;
    if (screen.kind === 'seat') {
      if (screen.wants === 'close-lid') this.later(800, () => this.fixture.setLid(true));
      if (screen.wants === 'confirm-lid-and-board')
        this.later(800, () => {
          this.fixture.setLid(true);
          this.send({ kind: 'confirm', what: 'lid-and-board' });
        });
    } else if (screen.kind === 'seal') {
      if (screen.wants === 'open-lid')
        this.later(500, () => {
          this.fixture.setLid(false);
          this.send({ kind: 'confirm', what: 'lid-open' });
        });
      if (screen.wants === 'seal-screw') this.later(2000, () => this.send({ kind: 'confirm', what: 'sealed' }));
      if (screen.wants === 'close-lid')
        this.later(500, () => {
          this.fixture.setLid(true);
          this.send({ kind: 'confirm', what: 'lid-closed' });
        });
    } else if (screen.kind === 'instruction') {
      if (screen.supplyOff) this.later(500, () => this.fixture.setLid(false));
      this.later(1500, () => this.send({ kind: 'confirm', what: 'instruction-done' }));
    } else if (screen.kind === 'operator-check') this.later(700, () => this.send({ kind: 'answer', ok: true }));
    else if (screen.kind === 'trim') {
      const { stage, direction, turns } = screen.trim;
      const way = direction === 'anticlockwise' ? -1 : 1;
      if (stage === 'beep-1') this.later(900, () => this.fixture.startTurning(way * 8, 0.5));
      else if (stage === 'beep-2') this.later(900, () => this.fixture.startTurning(way * 2, 0.1));
      else if (stage === 'turn') this.later(900, () => this.fixture.startTurning(way * (turns ?? 0), 0.5));
      else this.later(200, () => this.fixture.stopTurning());
    }
  }

  private later(ms: number, act: () => void): void {
    this.clock.after(ms, act);
  }
}
