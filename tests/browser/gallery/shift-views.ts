import { badMeter, base, good, idleLot, iso, now, off, printed, running, shown, type GalleryView } from './samples';

/** From the badge to the board on the fixture. */
export const shiftViews: Record<string, GalleryView> = {
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
};
