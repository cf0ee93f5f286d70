import type { HandsView } from '@/lib/contracts/bench-command';
import type { BenchView, RailFlag, RailsView, ReadinessItem, RunView } from '@/lib/contracts/bench-view';
import type { StepGroup } from '@/lib/sequence/step';
import type { TrimView } from '@/lib/trim/types';

/** What the views of the gallery are made of. Invented boards, lots and people. */

const groups: StepGroup[] = ['seat', 'find', 'trim', 'seal', 'verify', 'check', 'record'];
export const day = 86_400_000;
export const now = Date.now();
export const iso = (ms: number) => new Date(ms).toISOString();

function steps(current: StepGroup | null): RunView['stepGroups'] {
  const at = current === null ? groups.length : groups.indexOf(current);
  return groups.map((group, i) => ({ group, state: i < at ? 'done' : i === at ? 'current' : 'ahead' }));
}

export const printed: RailsView = {
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

export const trip = (volts: number, note: RailFlag['note'] = null, hollow = false): RailFlag => ({
  side: 'trip',
  volts,
  hollow,
  note,
});
export const release = (volts: number, note: RailFlag['note'] = null, hollow = false): RailFlag => ({
  ...trip(volts, note, hollow),
  side: 'release',
});

export const bothFound = (tripVolts: number, releaseVolts: number, note: RailFlag['note'] = null): RailsView => ({
  ...printed,
  flags: [trip(tripVolts), release(releaseVolts, note)],
  travelled: { fallingOnToVolts: tripVolts, fallingOffToVolts: 9.5, risingOffToVolts: releaseVolts, risingOn: true },
  hysteresisVolts: releaseVolts - tripVolts,
});

export const good: ReadinessItem[] = [
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
export const marks = (tested: number, current: boolean) =>
  Array.from({ length: 240 }, (_, i) => {
    const board = i + 1;
    if (board > tested) return current && board === tested + 1 ? 'C' : '.';
    return rejects.has(board) ? 'R' : second.has(board) ? 'W' : board === 99 ? 'N' : 'P';
  }).join('');

export const base: BenchView = {
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
  offer: null,
  engineering: null,
  readiness: good,
  call: null,
  label: null,
  refusal: null,
  screen: { kind: 'idle', last: { serial: 'CB1210264800183', verdict: 'pass', seconds: 36 } },
};

export const idleLot = { ...base.lot!, marks: marks(183, false) };

export function running(
  current: StepGroup | null,
  rails: RailsView,
  screen: RunView['screen'],
  more?: Partial<RunView>,
) {
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

export const trim = (change: Partial<TrimView>, rails: RailsView = lowRails) =>
  running('trim', rails, { kind: 'trim', trim: { ...trimming, ...change }, clockwiseRaises: true });

const lowRails: RailsView = {
  ...printed,
  flags: [],
  travelled: { fallingOnToVolts: 10.34, fallingOffToVolts: 9.85, risingOffToVolts: null, risingOn: false },
};
export const held = (volts: number): RailsView => ({
  ...printed,
  flags: [],
  travelled: { fallingOnToVolts: volts, fallingOffToVolts: null, risingOffToVolts: null, risingOn: false },
});
export const twoBeep = { liveTripVolts: null, lastTripIsStale: true, heldVolts: 10.75 } as const;
export const off = { state: 'off', volts: 0.3 } as const;
export const badMeter: ReadinessItem = {
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

export const shown = (view: BenchView, more: Omit<GalleryView, 'view'> = {}): GalleryView => ({ view, ...more });
