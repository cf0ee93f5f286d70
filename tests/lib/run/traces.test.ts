import { describe, expect, test } from 'vitest';
import { tracesOf } from '@/lib/run/traces';
import type { RunEvent } from '@/lib/run/types';
import type { StepGroup } from '@/lib/sequence/step';

const event = (during: StepGroup, given: RunEvent) => ({ during, event: given });

describe('tracesOf', () => {
  test('gives one trace a part of the step line, in order, with times from the start of the run', () => {
    const traces = tracesOf(
      [
        event('seat', { kind: 'prepared', id: 1, atMs: 100 }),
        event('seat', { kind: 'supply-is-on', id: 2, volts: 13.5, amps: 0.1, atMs: 150 }),
        event('find', { kind: 'probed', id: 3, voltsBefore: null, volts: 12, output: 'on', atMs: 200 }),
        event('find', { kind: 'probed', id: 4, voltsBefore: null, volts: 10.5, output: 'off', atMs: 300 }),
        event('verify', { kind: 'probed', id: 5, voltsBefore: null, volts: 12.4, output: 'on', atMs: 400 }),
      ],
      100,
    );
    expect(traces).toEqual([
      { kind: 'seat', atMs: [50], volts: [13.5], output: [-1] },
      { kind: 'find', atMs: [100, 200], volts: [12, 10.5], output: [1, 0] },
      { kind: 'verify', atMs: [300], volts: [12.4], output: [1] },
    ]);
  });

  test('keeps the standing supply where only the output was read, and says nothing before any reading', () => {
    const traces = tracesOf(
      [
        event('trim', { kind: 'sensed', id: 1, output: 'on', atMs: 0 }),
        event('trim', { kind: 'probed', id: 2, voltsBefore: null, volts: 10.65, output: 'on', atMs: 10 }),
        event('trim', { kind: 'stop', atMs: 15 }),
        event('trim', { kind: 'sensed', id: 3, output: 'off', atMs: 20 }),
        event('trim', { kind: 'supply-is-off', id: 4, confirmed: false, atMs: 30 }),
        event('trim', { kind: 'supply-is-off', id: 5, confirmed: true, volts: 0.1, by: 'meter', atMs: 40 }),
      ],
      0,
    );
    expect(traces).toEqual([{ kind: 'trim', atMs: [10, 20, 40], volts: [10.65, 10.65, 0.1], output: [1, 0, -1] }]);
  });
});
