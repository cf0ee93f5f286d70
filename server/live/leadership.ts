/** One screen at the bench of a station. */
export interface BenchScreen {
  id: string;
  /** Milliseconds of a monotonic clock: when it came, and when anything was last heard from it. */
  joinedMs: number;
  lastHeardMs(): number;
  tell(role: { leads: boolean }): void;
}

const goneAfterMs = 5000;

/**
 * Which screen of a station leads: the first that stands at its bench; others watch. A screen that is gone comes back within
 * five seconds, as after a reload, or the bench is lost: whatever is energised is switched off, and the next screen leads.
 */
export class Leadership {
  private leader: BenchScreen | null = null;
  private readonly waiting: BenchScreen[] = [];
  private timer: NodeJS.Timeout | null = null;

  constructor(
    private readonly onLost: () => void,
    private readonly now: () => number = () => performance.now(),
  ) {}

  leads(id: string): boolean {
    return this.leader?.id === id;
  }

  /** A screen that comes while the leader is away takes its place. */
  join(screen: BenchScreen): void {
    if (this.leader) {
      this.waiting.push(screen);
      screen.tell({ leads: false });
    } else this.promote(screen);
  }

  leave(id: string): void {
    const index = this.waiting.findIndex((screen) => screen.id === id);
    if (index >= 0) this.waiting.splice(index, 1);
    if (this.leader?.id !== id) return;
    const goneAtMs = this.leader.lastHeardMs();
    this.leader = null;
    // A reload may arrive before the old screen is known to be gone.
    const returned = this.waiting.findLastIndex((screen) => this.now() - screen.joinedMs < goneAfterMs);
    if (returned >= 0) return this.promote(this.waiting.splice(returned, 1)[0]!);
    this.timer = setTimeout(() => this.lost(), Math.max(0, goneAtMs + goneAfterMs - this.now()));
    this.timer.unref();
  }

  stop(): void {
    if (this.timer) clearTimeout(this.timer);
  }

  private lost(): void {
    this.timer = null;
    this.onLost();
    const next = this.waiting.shift();
    if (next) this.promote(next);
  }

  private promote(screen: BenchScreen): void {
    if (this.timer) clearTimeout(this.timer);
    this.timer = null;
    this.leader = screen;
    screen.tell({ leads: true });
  }
}
