import type { BenchView } from '@/lib/contracts/bench-view';
import type { Beep } from './flood-machine';

/** The beep whose reading is going on. */
export function heardBeep({ run }: BenchView): Beep | null {
  if (run?.screen.kind !== 'trim') return null;
  const { stage } = run.screen.trim;
  return stage === 'beep-1-heard' ? 1 : stage === 'beep-2-heard' ? 2 : null;
}
