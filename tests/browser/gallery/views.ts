import type { HandsView } from '@/lib/contracts/bench-command';
import type { BenchView, RailFlag, RailsView, ReadinessItem, RunView } from '@/lib/contracts/bench-view';
import type { StepGroup } from '@/lib/sequence/step';
import type { TrimView } from '@/lib/trim/types';

/** Views of a bench as a station would send them, one for every screen. Invented boards, lots and people. */

const groups: StepGroup[] = ['seat', 'find', 'trim', 'seal', 'verify', 'check', 'record'];
const day = 86_400_000;
const now = Date.now();
const iso = (ms: number) => new Date(ms).toISOString();

function steps(current: StepGroup | null): RunView['stepGroups'] {
  const at = current === null ? groups.length : groups.indexOf(current);
  return groups.map((group, i) => ({ group, state: i < at ? 'done' : i === at ? 'current' : 'ahead' }));
}

const printed: RailsView = {
  scaleMinVolts: 9.5,
  scaleMaxVolts: 13.5,
  tripLimits: { min: 10.7, max: 10.9 },
  releaseLimits: { min: 12.1, max: 12.5 },
  guardVolts: { tripMin: 10.72, tripMax: 10.88, releaseMin: 12.13, releaseMax: 12.47 },
  targetVolts: 10.8,
  flags: [],
  travelled: { fallingOnToVolts: null, fallingOffToVolts: null, risingOffToVolts: null, risingOn: false },
  hysteresisVolts: null,
};

const trip = (volts: number, note: RailFlag['note'] = null, hollow = false): RailFlag => ({
  side: 'trip',
  volts,
  hollow,
  note,
});
const release = (volts: number, note: RailFlag['note'] = null, hollow = false): RailFlag => ({
  ...trip(volts, note, hollow),
  side: 'release',
});

const bothFound = (tripVolts: number, releaseVolts: number, note: RailFlag['note'] = null): RailsView => ({
  ...printed,
  flags: [trip(tripVolts), release(releaseVolts, note)],
  travelled: { fallingOnToVolts: tripVolts, fallingOffToVolts: 9.5, risingOffToVolts: releaseVolts, risingOn: true },
  hysteresisVolts: releaseVolts - tripVolts,
});

const good: ReadinessItem[] = [
  {
    key: 'meter',
    label: 'DM-003',
    state: 'good',
    validFrom: iso(now - 220 * day),
    validUntil: iso(now + 139 * day),
    sentence: { code: 'meter-calibrated' },
  },
  {
    key: 'supply',
    label: 'PS-003',
    state: 'good',
    validFrom: iso(now - 270 * day),
    validUntil: iso(now + 92 * day),
    sentence: { code: 'supply-calibrated' },
  },
  {
    key: 'daily-check',
    label: '',
    state: 'good',
    validFrom: iso(now - 0.2 * day),
    validUntil: iso(now + 0.1 * day),
    sentence: { code: 'daily-check-valid' },
  },
  {
    key: 'commissioned',
    label: '',
    state: 'good',
    validFrom: iso(now - 19 * day),
    validUntil: iso(now + 162 * day),
    sentence: { code: 'commissioned' },
  },
  { key: 'links', label: '', state: 'good', validFrom: null, validUntil: null, sentence: { code: 'links-answer' } },
];

const rejects = new Set([38, 89, 122, 151, 177]);
const second = new Set([32, 46, 56, 63, 87, 134, 140, 145, 153, 159, 160]);
const marks = (tested: number, current: boolean) =>
  Array.from({ length: 240 }, (_, i) => {
    const board = i + 1;
    if (board > tested) return current && board === tested + 1 ? 'C' : '.';
    return rejects.has(board) ? 'R' : second.has(board) ? 'W' : board === 99 ? 'N' : 'P';
  }).join('');

const base: BenchView = {
  revision: 1,
  station: {
    code: 'station-3',
    name: 'Station 3',
    fixture: 'Fixture 12-A',
    simulated: true,
    hasController: true,
    hasWiperProbe: false,
    scheme: 'system',
  },
  operator: { accountId: 'a', number: '27', locale: 'en', mayCommission: false },
  lot: {
    lotId: '8f0e1c7e-1d2b-4c6a-9f5e-0a1b2c3d4e5f',
    code: '2648-B',
    boardTypeCode: 'CB1210',
    size: 240,
    marks: marks(183, true),
    tested: 183,
    passed: 178,
    rejected: 5,
    secondsEach: 38,
  },
  next: { stepGroups: groups, rails: printed },
  run: null,
  readiness: good,
  call: null,
  label: null,
  refusal: null,
  screen: { kind: 'idle', last: { serial: 'CB1210264800183', verdict: 'pass', seconds: 36 } },
};

const idleLot = { ...base.lot!, marks: marks(183, false) };

function running(current: StepGroup | null, rails: RailsView, screen: RunView['screen'], more?: Partial<RunView>) {
  const run: RunView = {
    serial: 'CB1210264800184',
    attempt: 1,
    stepGroups: steps(current),
    rails,
    supply: { state: 'on', volts: 10.75 },
    startedAtMs: 0,
    screen,
    ...more,
  };
  return { ...base, run, screen: { kind: 'run' } as const };
}

const trimming: TrimView = {
  stage: 'turn',
  direction: 'clockwise',
  turns: 1.75,
  words: { unit: 'turns', whole: 1, eighths: 6 },
  targetVolts: 10.8,
  toleranceVolts: 0.02,
  heldVolts: null,
  lastTripVolts: 10.34,
  lastTripIsStale: false,
  liveTripVolts: 10.34,
  finding: null,
  findingVolts: null,
  round: 1,
};

const trim = (change: Partial<TrimView>, rails: RailsView = lowRails) =>
  running('trim', rails, { kind: 'trim', trim: { ...trimming, ...change }, clockwiseRaises: true });

const lowRails: RailsView = {
  ...printed,
  flags: [],
  travelled: { fallingOnToVolts: 10.34, fallingOffToVolts: 9.85, risingOffToVolts: null, risingOn: false },
};
const held = (volts: number): RailsView => ({
  ...printed,
  flags: [],
  travelled: { fallingOnToVolts: volts, fallingOffToVolts: null, risingOffToVolts: null, risingOn: false },
});
const twoBeep = { liveTripVolts: null, lastTripIsStale: true, heldVolts: 10.75 } as const;
const off = { state: 'off', volts: 0.3 } as const;
const badMeter: ReadinessItem = {
  ...good[0]!,
  state: 'bad',
  validUntil: iso(now - day),
  sentence: { code: 'meter-calibration-ended' },
};

export interface GalleryView {
  view: BenchView;
  leads?: boolean;
  lost?: boolean;
  reading?: { volts: number; output: 'on' | 'off' | null; rail: 'falling' | 'rising' | 'off' };
  sound?: 'locked' | 'on' | 'muted';
  /** With the practice bench beside it. */
  practice?: boolean;
}

export const practiceHands: HandsView = {
  boardSerial: 'CB1210264800184',
  lidClosed: true,
  screwTurns: 11.32,
  travelTurns: 25,
  defect: 'none',
  cables: { supply: true, meter: true, controller: false },
  nextSerial: 'CB1210264800185',
};

const shown = (view: BenchView, more: Omit<GalleryView, 'view'> = {}): GalleryView => ({ view, ...more });

export const galleryViews: Record<string, GalleryView> = {
  'b1-badge': shown({ ...base, operator: null, lot: null, next: null, screen: { kind: 'badge' } }, { sound: 'locked' }),
  'b2-pin': shown({
    ...base,
    operator: null,
    lot: null,
    next: null,
    screen: { kind: 'pin', operatorNumber: '27', badgeReadIso: iso(now), retryAtIso: null, problem: null },
  }),
  'b2-pin-wrong': shown({
    ...base,
    operator: null,
    lot: null,
    next: null,
    screen: {
      kind: 'pin',
      operatorNumber: '27',
      badgeReadIso: iso(now),
      retryAtIso: iso(now + 3_600_000),
      problem: { code: 'wrong-pin' },
    },
  }),
  'b3-may-not-test': shown({
    ...base,
    readiness: [badMeter, ...good.slice(1)],
    screen: {
      kind: 'may-not-test',
      reasons: [{ code: 'meter-calibration-ended', faultCode: 'C-301' }],
      otherStation: 'Station 2',
    },
  }),
  'choose-lot': shown({
    ...base,
    lot: null,
    next: null,
    screen: {
      kind: 'choose-lot',
      lots: [
        { lotId: 'a', code: '2648-B', boardTypeCode: 'CB1210', size: 240, tested: 183 },
        { lotId: 'b', code: '2649-A', boardTypeCode: 'CB2420', size: 60, tested: 0 },
      ],
    },
  }),
  '02-idle': shown({ ...base, lot: idleLot }),
  'idle-refused': shown({
    ...base,
    lot: idleLot,
    refusal: {
      code: 'board-passed',
      params: { serial: 'CB1210264800179', atIso: iso(now - 3_600_000) },
      serial: 'CB1210264800179',
      atIso: iso(now),
    },
  }),
  'idle-label-failed': shown({
    ...base,
    lot: idleLot,
    label: { serial: 'CB1210264800183', state: 'failed', problem: 'The printer is out of paper.' },
  }),
  'empty-fixture': shown({ ...base, lot: idleLot, screen: { kind: 'empty-fixture', nextSerial: 'CB1210264800184' } }),
  'seat-close-lid': shown(running('seat', printed, { kind: 'seat', wants: 'close-lid' }, { supply: off })),
  'seat-place-board': shown(running('seat', printed, { kind: 'seat', wants: 'place-board' }, { supply: off })),
  'seat-confirm': shown({
    ...running('seat', printed, { kind: 'seat', wants: 'confirm-lid-and-board' }, { supply: off }),
    station: { ...base.station, hasController: false },
  }),
  measuring: shown(
    running('find', held(11.5), { kind: 'measuring', what: { code: 'run.find-points' }, done: 17, of: null }),
    { reading: { volts: 11.5, output: 'on', rail: 'falling' } },
  ),
  'measuring-verify': shown(
    running(
      'verify',
      {
        ...printed,
        flags: [trip(10.81)],
        travelled: { fallingOnToVolts: 10.81, fallingOffToVolts: 9.5, risingOffToVolts: 11.6, risingOn: false },
      },
      { kind: 'measuring', what: { code: 'run.verify' }, done: 1, of: 3 },
    ),
    { reading: { volts: 11.6, output: 'off', rail: 'rising' } },
  ),
  '01-prompted-clockwise': shown(trim({}), { reading: { volts: 9.85, output: 'off', rail: 'falling' } }),
  '01c-prompted-anticlockwise': shown(
    trim(
      {
        direction: 'anticlockwise',
        turns: 1.5,
        words: { unit: 'turns', whole: 1, eighths: 4 },
        lastTripVolts: 11.19,
        liveTripVolts: 11.19,
      },
      {
        ...printed,
        travelled: { fallingOnToVolts: 11.19, fallingOffToVolts: 10.75, risingOffToVolts: null, risingOn: false },
      },
    ),
    { reading: { volts: 10.75, output: 'off', rail: 'falling' } },
  ),
  'prompted-slow-link': shown(
    trim({ liveTripVolts: null, turns: 3.5, words: { unit: 'turns', whole: 3, eighths: 4 } }),
  ),
  'prompted-degrees': shown(trim({ turns: 0.31, words: { unit: 'degrees', degrees: 110 }, liveTripVolts: 10.66 })),
  'prompted-near': shown(
    trim({ turns: 0.11, words: { unit: 'degrees', degrees: 40 }, liveTripVolts: 10.765, heldVolts: 10.8 }, held(10.8)),
  ),
  'stop-turning': shown(trim({ stage: 'stop-turning', direction: null, turns: null, words: null })),
  'a1-first-beep': shown(trim({ stage: 'beep-1', ...twoBeep }, held(10.75))),
  'a2-flood': shown(trim({ stage: 'beep-1-heard', ...twoBeep }, held(10.75))),
  'a2-flood-second': shown(trim({ stage: 'beep-2-heard', ...twoBeep }, held(10.8))),
  'a3-second-beep': shown(
    trim(
      {
        stage: 'beep-2',
        ...twoBeep,
        heldVolts: 10.8,
        lastTripVolts: 10.762,
        turns: 0.125,
        words: { unit: 'degrees', degrees: 45 },
      },
      held(10.8),
    ),
  ),
  'a4-wrong-way': shown(
    trim(
      {
        stage: 'beep-1',
        ...twoBeep,
        finding: 'wrong-way',
        findingVolts: 0.25,
        direction: 'anticlockwise',
        turns: 2.5,
        words: { unit: 'turns', whole: 2, eighths: 4 },
        lastTripVolts: 10.09,
        lastTripIsStale: false,
      },
      { ...held(10.75), flags: [trip(10.34, 'before', true)] },
    ),
  ),
  'a5-no-effect': shown(
    trim({ stage: 'beep-1', ...twoBeep, lastTripIsStale: false, finding: 'no-effect', findingVolts: 12 }, held(10.75)),
  ),
  'finding-end-of-travel': shown(
    trim({
      stage: 'measuring',
      direction: null,
      turns: null,
      words: null,
      finding: 'end-of-travel',
      lastTripVolts: 10.52,
    }),
  ),
  'seal-supply-off': shown(
    running(
      'seal',
      bothFound(10.81, 12.23),
      { kind: 'seal', wants: 'supply-off' },
      { supply: { state: 'on', volts: 5.1 } },
    ),
  ),
  'seal-open-lid': shown(
    running('seal', bothFound(10.81, 12.23), { kind: 'seal', wants: 'open-lid' }, { supply: off }),
  ),
  'seal-screw': shown(running('seal', bothFound(10.81, 12.23), { kind: 'seal', wants: 'seal-screw' }, { supply: off })),
  'operator-check': shown(
    running('check', bothFound(10.81, 12.23), { kind: 'operator-check', question: 'Does the green lamp light?' }),
  ),
  '03-pass': shown({
    ...running(null, bothFound(10.81, 12.23), { kind: 'pass', seconds: 38 }, { supply: off }),
    lot: { ...base.lot!, marks: marks(184, false), tested: 184 },
    label: { serial: 'CB1210264800184', state: 'waiting', problem: null },
  }),
  '04-reject': shown({
    ...running(
      'verify',
      bothFound(10.84, 12.71, 'too-high'),
      {
        kind: 'reject',
        reason: 'release-too-high',
        cause: 'wrong-feedback-resistor',
        measured: { value: 12.71, unit: 'V', limit: 12.5 },
      },
      { supply: off },
    ),
    screen: { kind: 'bin', binCode: 'R3' },
  }),
  'reject-binned': shown(
    running(
      'find',
      {
        ...printed,
        travelled: { fallingOnToVolts: 9.5, fallingOffToVolts: null, risingOffToVolts: null, risingOn: false },
      },
      { kind: 'reject', reason: 'never-off', cause: 'output-shorted', measured: null },
      { supply: off },
    ),
  ),
  '05-fault': shown(
    running(
      'find',
      held(11.34),
      {
        kind: 'no-verdict',
        reason: 'supply-fault',
        code: 'S-204',
        detail: { code: 'run.fault', params: { detail: 'The supply did not answer for 2 s.' } },
        failingWhenStopped: false,
        stoppedAtVolts: 11.34,
      },
      { supply: off },
    ),
  ),
  'fault-not-confirmed': shown(
    running(
      'find',
      held(11.34),
      {
        kind: 'no-verdict',
        reason: 'link-lost',
        code: 'S-290',
        detail: null,
        failingWhenStopped: true,
        stoppedAtVolts: 11.34,
      },
      { supply: { state: 'maybe-on' } },
    ),
  ),
  stopped: shown({
    ...running(
      'trim',
      held(10.75),
      {
        kind: 'no-verdict',
        reason: 'operator-stop',
        code: null,
        detail: null,
        failingWhenStopped: false,
        stoppedAtVolts: 10.75,
      },
      { supply: off },
    ),
    call: { sinceIso: iso(now - 120_000), acknowledgedBy: null },
  }),
  starting: shown({
    ...base,
    operator: null,
    lot: null,
    next: null,
    screen: { kind: 'starting', what: { code: 'opening-instruments' } },
  }),
  'database-away': shown({ ...base, screen: { kind: 'starting', what: { code: 'database-away' } } }),
  'daily-check': shown({
    ...base,
    screen: {
      kind: 'daily-check',
      passed: true,
      validUntilIso: iso(now + 8 * 3_600_000),
      points: [
        { quantity: 'trip-volts', knownVolts: 10.8, toleranceVolts: 0.01, measuredVolts: 10.803, passed: true },
        { quantity: 'release-volts', knownVolts: 12.214, toleranceVolts: 0.012, measuredVolts: 12.209, passed: true },
      ],
    },
  }),
  commissioning: shown({
    ...base,
    screen: {
      kind: 'commissioning',
      state: 'done',
      what: { code: 'commissioning-done' },
      done: 40,
      of: 40,
      values: { overshoot: 0.052, settleMs: 84, waypointMs: 31, noiseVolts: 0.0012 },
    },
  }),
  lost: shown(trim({ stage: 'beep-1', ...twoBeep }, held(10.75)), { lost: true }),
  practice: shown(trim({ stage: 'beep-1', ...twoBeep }, held(10.75)), { practice: true }),
  watching: shown(trim({ stage: 'beep-1', ...twoBeep }, held(10.75)), { leads: false }),
  '24-volt': shown(
    running(
      'verify',
      {
        ...printed,
        scaleMinVolts: 20,
        scaleMaxVolts: 26.5,
        tripLimits: { min: 21.4, max: 21.8 },
        releaseLimits: { min: 23, max: 24 },
        guardVolts: null,
        targetVolts: 21.6,
        flags: [trip(20.95, 'before', true), release(22.6, 'before', true), trip(21.62), release(23.1)],
        travelled: { fallingOnToVolts: 21.62, fallingOffToVolts: 20, risingOffToVolts: 23.1, risingOn: true },
        hysteresisVolts: 1.48,
      },
      { kind: 'measuring', what: { code: 'run.ride-through' }, done: 0, of: null },
    ),
  ),
  'small-hysteresis': shown(
    running(
      null,
      {
        ...printed,
        scaleMinVolts: 8,
        scaleMaxVolts: 11,
        tripLimits: { min: 8.9, max: 9.1 },
        releaseLimits: { min: 9.4, max: 9.8 },
        targetVolts: 9,
        guardVolts: null,
        flags: [trip(9.02), release(9.61)],
        travelled: { fallingOnToVolts: 9.02, fallingOffToVolts: 8, risingOffToVolts: 9.61, risingOn: true },
        hysteresisVolts: 0.59,
      },
      { kind: 'pass', seconds: 31 },
      { supply: off },
    ),
  ),
};
