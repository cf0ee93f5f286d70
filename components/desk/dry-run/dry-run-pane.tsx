'use client';

import type { BoardType } from '@/lib/contracts/board-type';
import type { DryRunHandle } from './use-dry-run';

export interface DryRunPaneProps {
  /** From `useDryRun`: the editor holds it too, to lock its fields while `isAtWork` and to fill the lost-boards column. */
  dryRun: DryRunHandle;
  /** Its limits stand on the rails. */
  boardType: BoardType;
  revisionNumber: number;
  /** Version of the draft as saved now: a dry run of an older one is said to be of an earlier text. */
  draftVersion: number;
  /** The run's own page, with its tables. */
  addressOf(dryRunId: string): string;
  stations: readonly { code: string; name: string }[];
  /** Why no dry run can start now, such as an error in the draft; null: it can. */
  blocked: string | null;
}

/** The right column of the sequence editor: rails with what simulated boards gave, the yield sentence, settings. */
export function DryRunPane({ dryRun, revisionNumber }: DryRunPaneProps) {
  return <section aria-label={`Dry run of r${revisionNumber}`}>{dryRun.problem}</section>;
}
