import { afterEach, expect, test } from 'vitest';
import { sequences } from '@/db/seed/sequences';
import { benchInTest, ended, type BenchInTest } from './bench-in-test';

let open: BenchInTest | null = null;
afterEach(async () => {
  await open?.station.stop();
  open = null;
});

test('an instruction with the supply off is shown only after read-back below 2 V; with the lid closed again the run goes on to a pass', async () => {
  const { sequence } = sequences[0]!;
  const at = sequence.steps.findIndex(({ kind }) => kind === 'verify');
  const instruction = {
    id: 'move-jumper',
    name: '',
    enabled: true,
    kind: 'instruction',
    text: 'Open the lid and look at the jumper.',
    pictureId: null,
    supplyOff: true,
  } as const;
  const steps = sequence.steps.toSpliced(at, 0, instruction);
  const bench = (open = await benchInTest({ plan: { sequence: { ...sequence, steps } } }));
  await bench.signIn();
  await bench.until((view) => view.screen.kind === 'idle');
  bench.seat(3);
  await bench.station.command({ kind: 'scan', text: 'CB1210264900001' });
  const asked = await bench.until((view) => view.run?.screen.kind === 'instruction');
  expect(asked.run!.screen).toMatchObject({ text: 'Open the lid and look at the jumper.', supplyOff: true });
  expect(asked.run!.supply.state).toBe('off');
  expect((asked.run!.supply as { volts: number }).volts).toBeLessThan(2);
  expect(bench.bench.simulation!.fixture.isOn).toBe(false);
  await bench.until((view) => ended(view) && bench.ports.runs[0]!.closed === 1);
  expect(bench.problems).toEqual([]);
  expect(bench.ports.runs[0]!.result).toMatchObject({ verdict: 'pass' });
});
