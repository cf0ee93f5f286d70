import type { RunEvent } from '@/lib/run/types';
import type { Clock } from '../clock/clock';
import type { Answer } from './perform-effect';

type Change = { kind: 'lid'; closed: boolean } | { kind: 'board'; present: boolean };

/** Lid and board as last seen, and what changed since. Without a controller nothing is ever seen. */
export class FixtureWatch {
  private lidClosed: boolean | null = null;
  private boardPresent: boolean | null = null;
  private lastPollMs: number;

  constructor(
    private readonly hasController: boolean,
    private readonly clock: Pick<Clock, 'now'>,
  ) {
    this.lastPollMs = clock.now();
  }

  isDue(everyMs: number): boolean {
    return this.hasController && this.clock.now() - this.lastPollMs >= everyMs;
  }

  /** An effect of the run read the fixture itself. */
  learn(answer: Answer | RunEvent): void {
    if (answer.kind !== 'fixture-read') return;
    this.lidClosed = answer.lidClosed;
    this.boardPresent = answer.boardPresent;
  }

  /** Both switches have just been read: what has changed. */
  see(closed: boolean, present: boolean): Change[] {
    this.lastPollMs = this.clock.now();
    const changes: Change[] = [];
    if (closed !== this.lidClosed) changes.push({ kind: 'lid', closed });
    if (present !== this.boardPresent) changes.push({ kind: 'board', present });
    this.lidClosed = closed;
    this.boardPresent = present;
    return changes;
  }
}
