import type { TraceStretch } from '@/lib/contracts/unit-page';

export interface Reading {
  seconds: number;
  volts: number;
  /** 1 on, 0 off, -1 not read. */
  output: number;
  kind: string;
}

export interface RecordedPoint {
  side: 'trip' | 'release';
  seconds: number;
  volts: number;
  /** The value that the record states; otherwise only a change of the output that was seen. */
  recorded: boolean;
}

/** All stretches of a run as one series in time order. */
export function joinTraces(traces: readonly TraceStretch[]): Reading[] {
  return traces.flatMap(({ kind, atMs, volts, output }) =>
    atMs.map((ms, i) => ({ seconds: ms / 1000, volts: volts[i] ?? 0, output: output[i] ?? -1, kind })),
  );
}

/**
 * Where the output was seen to go off while trimming, and both recorded points at the last change of the output, of the
 * verification where there was one; without a change they are not drawn.
 */
export function recordedPoints(
  readings: readonly Reading[],
  tripVolts: number | null,
  releaseVolts: number | null,
): RecordedPoint[] {
  const changes: RecordedPoint[] = [];
  let before: Reading | null = null;
  for (const reading of readings) {
    if (reading.output === -1) continue;
    if (before && before.output !== reading.output)
      changes.push({
        side: reading.output === 0 ? 'trip' : 'release',
        seconds: reading.seconds,
        volts: reading.volts,
        recorded: false,
      });
    before = reading;
  }
  const kindAt = (seconds: number) => readings.find((reading) => reading.seconds === seconds)?.kind;
  const trims = changes.filter((change) => change.side === 'trip' && kindAt(change.seconds) === 'trim');
  const recordedAt = (side: RecordedPoint['side'], volts: number | null): RecordedPoint[] => {
    const crossed = changes.filter((change) => change.side === side);
    const verified = crossed.filter((change) => kindAt(change.seconds) === 'verify');
    const last = (verified.length > 0 ? verified : crossed).at(-1);
    if (volts === null || !last) return [];
    return [{ side, seconds: last.seconds, volts, recorded: true }];
  };
  return [...trims, ...recordedAt('trip', tripVolts), ...recordedAt('release', releaseVolts)];
}
