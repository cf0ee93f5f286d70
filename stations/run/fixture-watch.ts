import type { RunEvent } from '@/lib/run/types';
import type { Clock } from '../clock/clock';
import type { FixtureController } from '../instruments/fixture-controller';
import type { Answer } from './perform-effect';

type Change = { kind: 'lid'; closed: boolean } | { kind: 'board'; present: boolean };

/** Lid and board as last seen, and what changed since. Without a controller nothing is ever seen. */
export class FixtureWatch {
  private lidClosed: boolean | null = null;
  private boardPresent: boolean | null = null;
  private lastPollMs: number;

  constructor(
    private readonly controller: FixtureController | null,
    private readonly clock: Clock,
  ) {
    this.lastPollMs = clock.now();
  }

  isDue(everyMs: number): boolean {
    return this.controller !== null && this.clock.now() - this.lastPollMs >= everyMs;
  }

  /** An effect of the run read the fixture itself. */
  learn(answer: Answer | RunEvent): void {
    if (answer.kind !== 'fixture-read') return;
    this.lidClosed = answer.lidClosed;
    this.boardPresent = answer.boardPresent;
  }

  /** Reads both switches. Rejects as the controller does. */
  async poll(): Promise<Change[]> {
    if (!this.controller) return [];
    const closed = await this.controller.lidClosed();
    const present = await this.controller.boardPresent();
    this.lastPollMs = this.clock.now();
    const changes: Change[] = [];
    if (closed !== this.lidClosed) changes.push({ kind: 'lid', closed });
    if (present !== this.boardPresent) changes.push({ kind: 'board', present });
    this.lidClosed = closed;
    this.boardPresent = present;
    return changes;
  }
}
