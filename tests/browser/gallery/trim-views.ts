import { held, printed, running, shown, trim, trip, twoBeep, type GalleryView } from './samples';

/** Finding the points and trimming. */
export const trimViews: Record<string, GalleryView> = {
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
};
