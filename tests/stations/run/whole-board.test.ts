import { afterEach, expect, test } from 'vitest';
import { benchInTest, ended, type BenchInTest } from './bench-in-test';

let open: BenchInTest | null = null;
afterEach(async () => {
  await open?.station.stop();
  open = null;
});

test('takes a sound board from scan to pass over bytes: trimmed, sealed, verified, supply read back as off', async () => {
  const bench = (open = await benchInTest());
  await bench.signIn();
  await bench.until((view) => view.screen.kind === 'idle');
  bench.seat(3);
  expect(await bench.station.command({ kind: 'scan', text: 'CB1210264900001' })).toEqual({ ok: true });
  await bench.until((view) => ended(view) && view.screen.kind === 'run' && bench.ports.runs[0]!.closed === 1);
  const [run] = bench.ports.runs;
  expect(bench.problems).toEqual([]);
  expect(run!.result).toMatchObject({ verdict: 'pass', supplyOff: { confirmed: true } });
  const verified = run!.result!.measurements.find((m) => m.quantity === 'trip-volts' && m.phase === 'verified');
  expect(Math.abs(verified!.value - 10.8)).toBeLessThan(0.03);
  expect(bench.bench.simulation!.fixture.isOn).toBe(false);
});
