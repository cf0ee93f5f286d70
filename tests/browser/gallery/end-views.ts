import {
  base,
  bothFound,
  held,
  iso,
  marks,
  now,
  off,
  printed,
  release,
  running,
  shown,
  trim,
  trip,
  twoBeep,
  type GalleryView,
} from './samples';

const picture = '2f0c7b8e-1a4d-4e63-9b57-0c1d2e3f4a5b';

/** From sealing to the end of a run, and everything that can come between. */
export const endViews: Record<string, GalleryView> = {
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
  'instruction-supply-off': shown(
    running(
      'check',
      bothFound(10.81, 12.23),
      {
        kind: 'instruction',
        text: 'Open the lid and move jumper J2 to position B.',
        pictureId: picture,
        supplyOff: true,
      },
      { supply: off },
    ),
  ),
  'instruction-waits': shown(
    running(
      'check',
      bothFound(10.81, 12.23),
      { kind: 'instruction', text: 'Open the lid and move jumper J2 to position B.', pictureId: null, supplyOff: true },
      { supply: { state: 'maybe-on' } },
    ),
  ),
  'instruction-supply-on': shown(
    running('check', bothFound(10.81, 12.23), {
      kind: 'instruction',
      text: 'Look through the window of the lid. Compare the number on the relay with the card beside the bench; call an engineer if the two are not the same number.',
      pictureId: picture,
      supplyOff: false,
    }),
  ),
  soak: shown(
    running('check', bothFound(10.81, 12.23), {
      kind: 'measuring',
      what: { code: 'run.soak', params: { channel: 103 } },
      done: 12,
      of: 40,
      everyMs: 5_000,
    }),
    { reading: { volts: 12.5, output: 'on', rail: 'falling' } },
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
