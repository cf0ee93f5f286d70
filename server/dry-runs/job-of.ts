import type { Database } from '@/db/client';
import { findDryRun, type DryRunRow } from '@/db/queries/dry-runs';
import { singleChanges } from '@/lib/dry-run/single-changes';
import { changeWords } from '@/lib/dry-run/change-words';
import type { DryRunJob } from './job';
import { stationOf } from './station-of';

/** What is simulated for a row: its own sequence and board type, the released revision it was asked beside, its changes one by one. */
export async function jobOf(db: Database, row: DryRunRow, workers: number): Promise<DryRunJob> {
  const head = await findDryRun(db, row.id);
  const released = head?.releasedSequence ?? null;
  const changes = released ? singleChanges(released, row.sequence) : [];
  return {
    draft: {
      sequence: row.sequence,
      boardType: row.boardType,
      station: await stationOf(db, row.settings.stationCode),
      settings: row.settings,
    },
    released,
    changes: changes.map((change) => ({
      words: changeWords(change, released!),
      stepIds: change.stepIds,
      sequence: change.sequence,
    })),
    workers,
  };
}
