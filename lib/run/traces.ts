import type { StepGroup } from '../sequence/step';
import type { RunEvent } from './types';

/** Readings of one stretch of a run, as equally long arrays. Milliseconds since the run began, volts at the board; output 1 on, 0 off, -1 not read. */
export interface Trace {
  kind: StepGroup;
  atMs: number[];
  volts: number[];
  output: number[];
}

/** The readings among a run's events, one trace for each part of the step line that they belong to, in order. */
export function tracesOf(events: readonly { event: RunEvent; during: StepGroup }[], startedAtMs: number): Trace[] {
  const traces: Trace[] = [];
  let volts: number | null = null;
  for (const { event, during } of events) {
    volts = voltsOf(event) ?? volts;
    const output = outputOf(event);
    if (volts === null || (voltsOf(event) === null && output === -1)) continue;
    let trace = traces.at(-1);
    if (trace?.kind !== during) traces.push((trace = { kind: during, atMs: [], volts: [], output: [] }));
    trace.atMs.push(event.atMs - startedAtMs);
    trace.volts.push(volts);
    trace.output.push(output);
  }
  return traces;
}

/** At the board's supply terminals. */
function voltsOf(event: RunEvent): number | null {
  if (event.kind === 'probed' || event.kind === 'supply-is-on') return event.volts;
  if (event.kind === 'wiper-measured') return event.supplyVolts;
  return event.kind === 'supply-is-off' && event.confirmed ? event.volts : null;
}

function outputOf(event: RunEvent): number {
  return event.kind === 'probed' || event.kind === 'sensed' ? (event.output === 'on' ? 1 : 0) : -1;
}
