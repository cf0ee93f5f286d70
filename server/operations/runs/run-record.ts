import type { RunEvent, RunResult } from '@/lib/run/types';
import type { StepGroup } from '@/lib/sequence/step';

export interface RecordedEvent {
  event: RunEvent;
  during: StepGroup;
}

/** Batches are counted from 0; the same number is always the same events. */
export interface EventBatch {
  n: number;
  events: RecordedEvent[];
}

/** All that is stored of a run when it ends. */
export interface RunRecord {
  runId: string;
  batches: EventBatch[];
  result: RunResult;
  /** On the station's clock; null when recovery closed it. */
  seconds: number | null;
  endedAtIso: string;
}
