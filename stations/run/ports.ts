import type { BenchAnswer, BenchAsk, BenchPlace, PendingBin, ReferenceCheck, Standing } from '@/lib/bench/types';
import type { BoardType } from '@/lib/contracts/board-type';
import type { CommissioningValues, RunEvent, RunPlan, RunResult } from '@/lib/run/types';
import type { StepGroup } from '@/lib/sequence/step';
import type { Bench } from '../instruments/open-bench';

/** What a station needs of the server. A failure other than a refusal (the database is away) rejects. */
export interface StationPorts {
  ask(ask: BenchAsk, who: BenchPlace): Promise<BenchAnswer>;
  standing(who: BenchPlace): Promise<{ standing: Standing; pendingBin: PendingBin | null }>;
  endSession(sessionId: string): Promise<void>;
  saveScheme(scheme: 'day' | 'night' | 'system'): Promise<void>;
  saveLocale(accountId: string, locale: string): Promise<void>;
  saveCommissioning(values: CommissioningValues, referenceCode: string, accountId: string): Promise<void>;
  /** Begins to keep the events of an opened run. Works while the database is away. */
  logOf(plan: RunPlan): RunLog;
}

/** Keeps a run's events as they happen and stores the run once, exactly once. Neither method fails: what cannot be stored waits. */
export interface RunLog {
  /** `during` is the part of the step line that the event belongs to. */
  record(event: RunEvent, during: StepGroup): void;
  /** Seconds from scan to end on the station's clock. `stored` is false while the database is away. */
  close(result: RunResult, seconds: number): Promise<{ stored: boolean; validUntilIso: string | null }>;
}

/** Measures a station with its reference board; in stations/commissioning. Rejects when it cannot, or when aborted. */
export type CommissionBench = (job: {
  bench: Bench;
  boardType: BoardType;
  check: ReferenceCheck;
  signal: AbortSignal;
  onProgress(step: string, done: number, of: number): void;
}) => Promise<CommissioningValues>;
