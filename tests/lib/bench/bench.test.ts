import { describe, expect, test } from 'vitest';
import { BenchInTest, rejected, standing } from './bench-in-test';

const first = 'CB1210261000001';
const second = 'CB1210261000002';
const ready = (hasController = true) => new BenchInTest(hasController).ready();
const atWork = () => ready().signIn().takeLot().empty();

describe('before anybody is signed in', () => {
  test('the supply is switched off and the links answer before the badge is asked for', () => {
    const bench = new BenchInTest();
    expect(bench.screen).toEqual({ kind: 'starting', what: { code: 'opening-instruments' } });
    bench.tell({ kind: 'instruments', opened: true, linksDown: [], strangers: [] });
    expect(bench.screen).toEqual({ kind: 'starting', what: { code: 'switching-supply-off' } });
    bench.tell({ kind: 'supply', confirmedOff: true });
    expect(bench.screen).toEqual({ kind: 'badge' });
  });

  test('nothing but a badge is taken', () => {
    const bench = ready();
    for (const text of [first, 'SWL-2610-01', 'SWN-R1']) {
      expect(bench.scan(text)).toEqual([]);
      expect(bench.refusal).toMatchObject({ code: 'sign-in-first' });
    }
  });

  test('a wrong PIN says so and when to try again, and another badge begins anew', () => {
    const bench = ready();
    bench.scan('SWB-4471');
    bench.answer({ ok: true, kind: 'badge', value: { accountId: 'a1', number: '14' } });
    bench.command({ kind: 'pin', digits: '0000' });
    bench.answer({ ok: false, refusal: { code: 'wrong-pin' }, retryAtIso: '2026-03-02T07:04:02.000Z' });
    expect(bench.screen).toMatchObject({
      kind: 'pin',
      operatorNumber: '14',
      problem: { code: 'wrong-pin' },
      retryAtIso: '2026-03-02T07:04:02.000Z',
    });
    bench.command({ kind: 'another-badge' });
    expect(bench.screen).toEqual({ kind: 'badge' });
  });
});

describe('a signed-in bench', () => {
  test('shows why it may not test, and opens by itself once nothing forbids it', () => {
    const bench = atWork();
    const reason = { code: 'meter-calibration-ended', faultCode: 'C-301' };
    bench.tell({ kind: 'standing', standing: { ...standing, reasons: [reason] } });
    expect(bench.screen).toMatchObject({ kind: 'may-not-test', reasons: [reason] });
    bench.tell({ kind: 'standing', standing });
    expect(bench.screen).toEqual({ kind: 'idle', last: null });
  });

  test('goes back to the badge when its session ends, and keeps the bin that a reject owes', () => {
    const bench = atWork().startRun(first).endRun(rejected(first));
    bench.tell({ kind: 'standing', standing: { ...standing, signedIn: false } });
    expect(bench.screen).toEqual({ kind: 'badge' });
    bench.signIn();
    expect(bench.screen).toEqual({ kind: 'bin', binCode: 'R1' });
  });

  test('a serial typed twice must be the same twice', () => {
    const bench = atWork();
    expect(bench.command({ kind: 'serial-by-hand', serial: first, again: second })).toEqual([]);
    expect(bench.refusal).toMatchObject({ code: 'serials-differ' });
    expect(bench.command({ kind: 'serial-by-hand', serial: first, again: ` ${first.toLowerCase()}` })).toMatchObject([
      { kind: 'ask', ask: { kind: 'board', serial: first, byHand: true } },
    ]);
  });

  test('a shift does not end in the middle of a board, nor before the bin is scanned', () => {
    const bench = atWork().startRun(first);
    bench.command({ kind: 'end-shift' });
    expect(bench.refusal).toMatchObject({ code: 'finish-board-first' });
    bench.endRun(rejected(first)).command({ kind: 'end-shift' });
    expect(bench.refusal).toMatchObject({ code: 'bin-first', params: { bin: 'R1' } });
    bench.scan('SWN-R1');
    bench.answer({ ok: true, kind: 'bin', value: { lot: null } });
    expect(bench.command({ kind: 'end-shift' })).toEqual([{ kind: 'end-session', sessionId: 's1' }]);
    expect(bench.screen).toEqual({ kind: 'badge' });
  });

  test('someone else’s badge is refused until the shift ends', () => {
    const bench = atWork();
    bench.scan('SWB-4502');
    expect(bench.refusal).toMatchObject({ code: 'end-shift-first', params: { operator: '14' } });
  });
});

describe('the next board', () => {
  test('another board while one is tested is named, and so is the one in the fixture', () => {
    const bench = atWork().startRun(first);
    expect(bench.scan(second)).toEqual([]);
    expect(bench.refusal).toMatchObject({ code: 'other-board', params: { scanned: second, held: first } });
    bench.scan(first);
    expect(bench.refusal).toMatchObject({ code: 'already-testing' });
  });

  test('starts from the pass by its scan, once the fixture was seen empty', () => {
    const bench = atWork().startRun(first).endRun({});
    bench.tell({ kind: 'fixture', lidClosed: true, boardPresent: true });
    expect(bench.scan(second)).toEqual([]);
    expect(bench.refusal).toMatchObject({ code: 'other-board', params: { scanned: second, held: first } });
    bench.tell({ kind: 'fixture', lidClosed: false, boardPresent: true });
    expect(bench.scan(second)).toEqual([]);
    bench.tell({ kind: 'fixture', lidClosed: false, boardPresent: false });
    bench.tell({ kind: 'fixture', lidClosed: false, boardPresent: true });
    expect(bench.scan(second)).toMatchObject([{ kind: 'ask', ask: { kind: 'board', serial: second } }]);
  });

  test('without a controller the operator says that the fixture is empty, and the scanned board starts', () => {
    const bench = ready(false).signIn().takeLot().empty().startRun(first).endRun({});
    bench.scan(second);
    expect(bench.screen).toEqual({ kind: 'empty-fixture', nextSerial: second });
    expect(bench.command({ kind: 'confirm', what: 'fixture-empty' })).toMatchObject([
      { kind: 'ask', ask: { kind: 'board', serial: second } },
    ]);
  });

  test('where a controller sees the fixture, nobody’s word counts instead', () => {
    const bench = atWork().startRun(first).endRun({});
    bench.command({ kind: 'confirm', what: 'fixture-empty' });
    expect(bench.refusal).toMatchObject({ code: 'not-now' });
    expect(bench.state.fixture.seenEmpty).toBe(false);
  });

  test('after a fault the same board is tried again where it lies; another is not', () => {
    const bench = atWork().startRun(first).endRun({ verdict: 'no-verdict', noVerdictReason: 'supply-fault' });
    expect(bench.scan(second)).toEqual([]);
    expect(bench.command({ kind: 'try-again' })).toMatchObject([
      { kind: 'ask', ask: { kind: 'board', serial: first } },
    ]);
  });

  test('a lid opened over an empty fixture in the middle of a run frees nothing for the next board', () => {
    const bench = atWork().startRun(first);
    bench.tell({ kind: 'fixture', lidClosed: false, boardPresent: false });
    bench.endRun({ verdict: 'no-verdict', noVerdictReason: 'board-removed' });
    expect(bench.scan(second)).toEqual([]);
    expect(bench.refusal).toMatchObject({ code: 'other-board' });
  });

  test.each([
    ['the database is away', { kind: 'database', away: true }, 'database-away'],
    ['the supply is not known to be off', { kind: 'supply', confirmedOff: false }, 'supply-not-confirmed-off'],
    ['a link is down', { kind: 'instruments', opened: true, linksDown: ['meter'], strangers: [] }, 'instruments-away'],
    [
      'a meter stands there that nobody set up',
      { kind: 'instruments', opened: true, linksDown: [], strangers: ['meter'] },
      'wrong-instrument',
    ],
  ] as const)('does not start while %s', (_, event, code) => {
    const bench = atWork();
    bench.tell(event as Parameters<BenchInTest['tell']>[0]);
    expect(bench.scan(first)).toEqual([]);
    expect(bench.refusal).toMatchObject({ code });
  });
});

describe('stop', () => {
  test('reaches the run at once, even while the server is asked something', () => {
    const bench = atWork().startRun(first);
    bench.command({ kind: 'call-engineer' });
    expect(bench.command({ kind: 'stop' })).toEqual([{ kind: 'run-event', event: { kind: 'stop' } }]);
  });

  test('is never refused', () => {
    for (const bench of [new BenchInTest(), ready(), ready().signIn(), atWork()]) {
      bench.command({ kind: 'stop' });
      expect(bench.refusal).toBeNull();
    }
  });
});

test('a daily check shows its points, and leaving it leads back to the lots', () => {
  const bench = ready().signIn().empty();
  bench.scan('REF-CB1210-1');
  const check = { referenceCode: 'REF-CB1210-1', tripVolts: 10.8, releaseVolts: 12.29, toleranceVolts: 0.02 };
  bench.answer({
    ok: true,
    kind: 'board',
    value: { plan: { serial: 'REF-CB1210-1' } as never, check, engineering: false },
  });
  bench.endRun({ reference: { passed: true, points: [], validUntilIso: '2026-03-02T19:04:00.000Z' } });
  expect(bench.screen).toMatchObject({ kind: 'daily-check', passed: true });
  expect(bench.command({ kind: 'continue' })).toMatchObject([{ kind: 'ask', ask: { kind: 'lots' } }]);
});

test('commissioning is an engineer’s: scanned, seated, measured, and stopped by stop', () => {
  const bench = atWork();
  bench.command({ kind: 'start-commissioning' });
  expect(bench.refusal).toMatchObject({ code: 'not-permitted' });
  bench.state = { ...bench.state, operator: { ...bench.state.operator!, mayCommission: true } };
  bench.command({ kind: 'start-commissioning' });
  bench.scan('REF-CB1210-1');
  const check = { referenceCode: 'REF-CB1210-1', tripVolts: 10.8, releaseVolts: 12.29, toleranceVolts: 0.02 };
  expect(bench.answer({ ok: true, kind: 'reference', value: { check, boardType: {} as never } })).toEqual([]);
  expect(bench.tell({ kind: 'fixture', lidClosed: true, boardPresent: true })).toMatchObject([
    { kind: 'start-commissioning' },
  ]);
  expect(bench.command({ kind: 'stop' })).toEqual([{ kind: 'stop-commissioning' }]);
  bench.tell({
    kind: 'commissioning-over',
    values: null,
    problem: { code: 'commissioning-stopped' },
    supplyConfirmedOff: true,
  });
  expect(bench.screen).toMatchObject({ kind: 'commissioning', state: 'failed' });
});
