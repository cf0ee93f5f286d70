import type { BenchEvent, BenchState } from '@/lib/bench/types';
import type { Clock } from '../clock/clock';
import { safeOff, type SafeOffReport } from '../instruments/safe-off';
import type { Instruments } from './bench';
import { checkLinks, isSafe } from './links';

export type OpenBench = Instruments & { close(): Promise<void> };
type Unstamped<E> = E extends unknown ? Omit<E, 'atIso'> : never;
export type BenchTold = Unstamped<Extract<BenchEvent, { kind: 'instruments' | 'supply' | 'fixture' }>>;

export interface BenchKeeperOptions {
  open(): Promise<OpenBench>;
  clock: Clock;
  state(): BenchState;
  tell(event: BenchTold): Promise<void>;
  onProblem(error: unknown): void;
}

const checkLinksEveryMs = 5000;
const retryEveryMs = 1500;

/** Looks after the instruments while nothing runs: sees lid and board, notices a cable pulled, makes the supply safe again. */
export class BenchKeeper {
  bench: OpenBench | null = null;
  private checkedAtMs = -Infinity;

  constructor(private readonly options: BenchKeeperOptions) {}

  /** Opens the ports and switches the supply off with read-back. Not confirmed when a port cannot be opened. */
  async openSafely(): Promise<SafeOffReport> {
    const { clock, open, tell, onProblem } = this.options;
    this.checkedAtMs = clock.now();
    try {
      this.bench = await open();
    } catch (error) {
      onProblem(error);
      return { confirmed: false };
    }
    const off = await safeOff(this.bench, clock);
    const { down } = await checkLinks(this.bench);
    await tell({ kind: 'supply', confirmedOff: off.confirmed });
    await tell({ kind: 'instruments', opened: true, linksDown: down });
    return off;
  }

  /** One look; called again and again. */
  async look(): Promise<void> {
    const { ready } = this.options.state();
    const troubled = !this.bench || ready.linksDown.length > 0 || !ready.supplyOff;
    if (this.options.clock.now() - this.checkedAtMs >= (troubled ? retryEveryMs : checkLinksEveryMs)) {
      if (this.bench) await this.checkBench(this.bench);
      else await this.openSafely();
    }
    await this.lookAtFixture();
  }

  async close(): Promise<SafeOffReport> {
    const { bench } = this;
    if (!bench) return { confirmed: false };
    const off = await safeOff(bench, this.options.clock);
    this.bench = null;
    await bench.close();
    return off;
  }

  private async checkBench(bench: OpenBench): Promise<void> {
    const { clock, state, tell } = this.options;
    const { down, supplyVolts } = await checkLinks(bench);
    this.checkedAtMs = clock.now();
    if (down.join() !== state().ready.linksDown.join())
      await tell({ kind: 'instruments', opened: true, linksDown: down });
    if (state().ready.supplyOff && isSafe(supplyVolts)) return;
    const off = await safeOff(bench, clock);
    if (off.confirmed !== state().ready.supplyOff) await tell({ kind: 'supply', confirmedOff: off.confirmed });
  }

  private async lookAtFixture(): Promise<void> {
    const { state, tell } = this.options;
    const controller = this.bench?.controller;
    if (!controller || state().ready.linksDown.includes('controller')) return;
    try {
      const lidClosed = await controller.lidClosed();
      const boardPresent = await controller.boardPresent();
      const { fixture } = state();
      if (lidClosed !== fixture.lidClosed || boardPresent !== fixture.boardPresent || !fixture.seenEmpty)
        await tell({ kind: 'fixture', lidClosed, boardPresent });
    } catch {
      this.checkedAtMs = -Infinity;
    }
  }
}
