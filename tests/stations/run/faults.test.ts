import { afterEach, describe, expect, test } from 'vitest';
import type { BenchView } from '@/lib/contracts/bench-view';
import { benchInTest, ended, type BenchInTest, type BenchInTestOptions } from './bench-in-test';

let open: BenchInTest | null = null;
afterEach(async () => {
  await open?.station.stop();
  open = null;
});

const searching = (view: BenchView) =>
  view.run?.screen.kind === 'measuring' &&
  view.run.stepGroups.some((each) => each.group === 'find' && each.state === 'current');

async function searchingBench(options: BenchInTestOptions = {}): Promise<BenchInTest> {
  const bench = (open = await benchInTest(options));
  await bench.signIn();
  await bench.until((view) => view.screen.kind === 'idle');
  bench.seat(5);
  await bench.station.command({ kind: 'scan', text: 'CB1210264900002' });
  await bench.until(searching);
  await bench.clock.sleep(700);
  expect(bench.bench.simulation!.fixture.isOn).toBe(true);
  return bench;
}

const over = (bench: BenchInTest) =>
  bench.until((view) => ended(view) && view.screen.kind === 'run' && bench.ports.runs.at(-1)!.closed > 0);
const isOn = (bench: BenchInTest) => bench.bench.simulation!.fixture.isOn;

describe('whatever breaks a search, the board gets no verdict, one record, and the supply is read back as off', () => {
  const breaks: [string, string, (bench: BenchInTest) => void | Promise<unknown>][] = [
    ['the operator stops', 'operator-stop', (bench) => bench.station.command({ kind: 'stop' })],
    ['the lid opens', 'lid-opened', (bench) => bench.bench.simulation!.fixture.setLid(false)],
    ['the board is taken out', 'board-removed', (bench) => bench.bench.simulation!.fixture.seat(null)],
    ['the bench screen is gone', 'bench-lost', (bench) => bench.station.benchLost()],
    ['the meter is unplugged', 'link-lost', (bench) => bench.bench.simulation!.ports.meter.setPlugged(false)],
    [
      'the controller is unplugged',
      'link-lost',
      (bench) => bench.bench.simulation!.ports.controller!.setPlugged(false),
    ],
    [
      'the overvoltage protection trips',
      'overvoltage-tripped',
      (bench) => bench.bench.simulation!.fixture.setOvervoltage(1),
    ],
  ];
  test.each(breaks)('%s', async (_, reason, breakIt) => {
    const bench = await searchingBench();
    await breakIt(bench);
    const view = await over(bench);
    const [run, ...more] = bench.ports.runs;
    expect(more).toEqual([]);
    expect(run).toMatchObject({
      closed: 1,
      result: { verdict: 'no-verdict', noVerdictReason: reason, supplyOff: { confirmed: true } },
    });
    expect(run!.result!.supplyOff.volts).toBeLessThan(2);
    expect(view.run!.screen).toMatchObject({ kind: 'no-verdict', reason });
    expect(isOn(bench)).toBe(false);
    expect(bench.problems).toEqual([]);
  });

  test('the supply is unplugged while it is on: nobody says that it is off, and no board is tested until it is', async () => {
    const bench = await searchingBench();
    bench.bench.simulation!.ports.supply.setPlugged(false);
    const view = await over(bench);
    expect(bench.ports.runs[0]).toMatchObject({
      closed: 1,
      result: { verdict: 'no-verdict', noVerdictReason: 'link-lost', supplyOff: { confirmed: false } },
    });
    expect(view.run!.supply).toEqual({ state: 'maybe-on' });
    expect(isOn(bench)).toBe(true);
    const again = await bench.station.command({ kind: 'try-again' });
    expect(again).toMatchObject({ ok: false });
    bench.bench.simulation!.ports.supply.setPlugged(true);
    await bench.clock.sleep(60_000);
    expect(isOn(bench)).toBe(false);
    expect(await bench.station.command({ kind: 'try-again' })).toEqual({ ok: true });
    await bench.until((seen) => seen.run?.screen.kind === 'pass');
    expect(bench.ports.runs.map((run) => run.plan.serial)).toEqual(['CB1210264900002', 'CB1210264900002']);
  });

  test('the server shuts down: the run is closed before the ports are', async () => {
    const bench = await searchingBench();
    expect(await bench.station.stop()).toMatchObject({ confirmed: true });
    expect(bench.ports.runs[0]).toMatchObject({
      closed: 1,
      result: { verdict: 'no-verdict', noVerdictReason: 'shutdown', supplyOff: { confirmed: true } },
    });
    expect(isOn(bench)).toBe(false);
  });

  test('the operator was signed out elsewhere', async () => {
    const bench = await searchingBench();
    bench.ports.standingNow = { ...bench.ports.standingNow, signedIn: false };
    await bench.station.refresh();
    await bench.until((view) => view.screen.kind === 'badge');
    expect(bench.ports.runs[0]).toMatchObject({ closed: 1, result: { noVerdictReason: 'bench-lost' } });
    expect(isOn(bench)).toBe(false);
  });

  test('the database goes away: the run finishes, and no new one starts', async () => {
    const bench = await searchingBench();
    bench.ports.away = true;
    await bench.until(
      (view) =>
        view.run?.screen.kind === 'pass' && view.readiness.some((i) => i.key === 'database' && i.state === 'bad'),
    );
    expect(bench.ports.runs[0]).toMatchObject({ closed: 1, result: { verdict: 'pass' } });
    bench.bench.simulation!.fixture.setLid(false);
    bench.bench.simulation!.fixture.seat(null);
    await bench.clock.sleep(2000);
    expect(await bench.station.command({ kind: 'scan', text: 'CB1210264900003' })).toMatchObject({
      ok: false,
      code: 'database-away',
    });
    bench.ports.away = false;
    await bench.station.refresh();
    expect(await bench.station.command({ kind: 'scan', text: 'CB1210264900003' })).toEqual({ ok: true });
  });
});

test('a station without a controller runs a board on the operator’s word and sees the fixture empty by it too', async () => {
  const steps = (await import('@/db/seed/sequences')).sequences[0]!.sequence.steps;
  const sequence = {
    ...(await import('@/db/seed/sequences')).sequences[0]!.sequence,
    steps: steps.filter((step) => step.kind !== 'ride-through'),
  };
  const bench = (open = await benchInTest({ hasController: false, plan: { sequence } }));
  await bench.signIn();
  bench.seat(8);
  await bench.station.command({ kind: 'scan', text: 'CB1210264900004' });
  await bench.until((view) => view.run?.screen.kind === 'pass' && view.screen.kind === 'run');
  expect(await bench.station.command({ kind: 'scan', text: 'CB1210264900005' })).toEqual({ ok: true });
  expect(bench.view().screen).toEqual({ kind: 'empty-fixture', nextSerial: 'CB1210264900005' });
  expect(bench.ports.runs).toHaveLength(1);
  bench.seat(9);
  await bench.station.command({ kind: 'confirm', what: 'fixture-empty' });
  expect(bench.ports.runs).toHaveLength(2);
});

test('a reject locks scans until its own bin is scanned', async () => {
  const bench = (open = await benchInTest());
  await bench.signIn();
  await bench.until((view) => view.screen.kind === 'idle');
  bench.seat(5, 'zener-open');
  await bench.station.command({ kind: 'scan', text: 'CB1210264900006' });
  await bench.until((view) => view.screen.kind === 'bin');
  expect(bench.view().screen).toEqual({ kind: 'bin', binCode: 'R1' });
  const scan = (text: string) => bench.station.command({ kind: 'scan', text });
  expect(await scan('CB1210264900007')).toMatchObject({ ok: false, code: 'bin-first', params: { bin: 'R1' } });
  expect(await bench.station.command({ kind: 'end-shift' })).toMatchObject({ ok: false, code: 'bin-first' });
  expect(await scan('SWN-R2')).toMatchObject({ ok: false, code: 'wrong-bin' });
  expect(await scan('SWN-R1')).toEqual({ ok: true });
  bench.bench.simulation!.fixture.setLid(false);
  bench.bench.simulation!.fixture.seat(null);
  await bench.until((view) => view.screen.kind === 'idle');
  expect(bench.view().screen).toMatchObject({ last: { serial: 'CB1210264900006', verdict: 'reject' } });
});
