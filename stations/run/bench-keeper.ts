import type { BenchEvent, BenchState } from '@/lib/bench/types';
import type { Clock } from '../clock/clock';
import type { Bench } from '../instruments/open-bench';
import type { SafeOffReport } from '../instruments/safe-off';
import { checkLinks, type ExpectedIdentities, type LinksSeen } from './links';

type Unstamped<E> = E extends unknown ? Omit<E, 'atIso'> : never;
export type BenchTold = Unstamped<Extract<BenchEvent, { kind: 'instruments' | 'supply' | 'fixture' }>>;

export interface BenchKeeperOptions {
  open(): Promise<Bench>;
  expected: ExpectedIdentities;
  clock: Clock;
  state(): BenchState;
  tell(event: BenchTold): Promise<void>;
  onProblem(error: unknown): void;
}

const checkLinksEveryMs = 5000;
const retryEveryMs = 1500;

/** Looks after the instruments while nothing runs: sees lid and board, notices a cable pulled, makes the supply safe again. */
export class BenchKeeper {
  bench: Bench | null = null;
  private checkedAtMs = -Infinity;

  constructor(private readonly options: BenchKeeperOptions) {}

  /** Opens the ports and switches the supply off with read-back. Not confirmed when the supply cannot be reached. */
  async openSafely(): Promise<SafeOffReport> {
    const { open, tell, expected, onProblem } = this.options;
    try {
      this.bench = await open();
    } catch (error) {
      onProblem(error);
      return { confirmed: false };
    } finally {
      this.checkedAtMs = this.options.clock.now();
    }
    const off = await this.bench.safeOff();
    await tell({ kind: 'supply', confirmedOff: off.confirmed });
    await this.tellLinks(await checkLinks(this.bench, expected));
    return off;
  }

  /** One look; called again and again. */
  async look(): Promise<void> {
    const { ready } = this.options.state();
    const troubled = !this.bench || ready.linksDown.length > 0 || ready.strangers.length > 0 || !ready.supplyOff;
    if (this.options.clock.now() - this.checkedAtMs >= (troubled ? retryEveryMs : checkLinksEveryMs)) {
      if (this.bench) await this.checkBench(this.bench);
      else await this.openSafely();
    }
    await this.lookAtFixture();
  }

  async close(): Promise<SafeOffReport> {
    const { bench } = this;
    if (!bench) return { confirmed: false };
    const off = await bench.safeOff();
    this.bench = null;
    await bench.close();
    return off;
  }

  private async checkBench(bench: Bench): Promise<void> {
    const { clock, state, tell, expected } = this.options;
    if (state().ready.linksDown.length > 0) await bench.reopen();
    const seen = await checkLinks(bench, expected);
    this.checkedAtMs = clock.now();
    await this.tellLinks(seen);
    if (state().ready.supplyOff && seen.supplySafe) return;
    const off = await bench.safeOff();
    if (off.confirmed !== state().ready.supplyOff) await tell({ kind: 'supply', confirmedOff: off.confirmed });
  }

  private async tellLinks({ down, strangers }: LinksSeen): Promise<void> {
    const { ready } = this.options.state();
    if (ready.opened && down.join() === ready.linksDown.join() && strangers.join() === ready.strangers.join()) return;
    await this.options.tell({ kind: 'instruments', opened: true, linksDown: down, strangers });
  }

  private async lookAtFixture(): Promise<void> {
    const { state, tell } = this.options;
    const controller = this.bench?.controller;
    if (!controller || state().ready.linksDown.includes('controller')) return;
    try {
      const lidClosed = await controller.lidClosed();
      const boardPresent = await controller.boardPresent();
      const { fixture } = state();
      const changed = lidClosed !== fixture.lidClosed || boardPresent !== fixture.boardPresent;
      const emptied = !lidClosed && !boardPresent && !fixture.seenEmpty;
      if (changed || emptied) await tell({ kind: 'fixture', lidClosed, boardPresent });
    } catch {
      this.checkedAtMs = -Infinity;
    }
  }
}
