import type { BenchView } from '@/lib/contracts/bench-view';

/** What a change of the view sounds like. Rhythms differ, so that they are told apart in noise. */
export type BenchSound = 'beep' | 'pass' | 'reject' | 'fault' | 'tick';

/** The sound of a change, or null. The first view after a reload is silent but for a fault that still stands. */
export function soundBetween(before: BenchView | null, after: BenchView): BenchSound | null {
  const now = soundingOf(after);
  if (!before) return now === 'fault' ? now : null;
  const same = sameRun(before, after) && soundingOf(before) === now;
  return same ? null : now;
}

const sameRun = (a: BenchView, b: BenchView) => a.run?.serial === b.run?.serial && a.run?.attempt === b.run?.attempt;

function soundingOf({ run }: BenchView): BenchSound | null {
  switch (run?.screen.kind) {
    case 'pass':
    case 'reject':
      return run.screen.kind;
    case 'no-verdict':
      return run.screen.reason === 'operator-stop' && run.supply.state === 'off' ? null : 'fault';
    default:
      return null;
  }
}

/** Whether a fault stands that must be heard until somebody touches the screen. */
export const faultStands = (view: BenchView) => soundingOf(view) === 'fault';

/**
 * Milliseconds between ticks while a prompted trim nears its target: 600 far away, 90 at the edge; 0 is a steady tone,
 * inside the tolerance; null is silence.
 */
export function tickIntervalMs(view: BenchView): number | null {
  if (view.run?.screen.kind !== 'trim') return null;
  const { stage, liveTripVolts, targetVolts, toleranceVolts } = view.run.screen.trim;
  if (stage !== 'turn' || liveTripVolts === null) return null;
  const away = Math.abs(liveTripVolts - targetVolts) / toleranceVolts;
  if (away <= 1) return 0;
  if (away > 12) return null;
  return Math.round(90 + ((away - 1) / 11) * 510);
}
