import { describe, expect, it } from 'vitest';
import { admitStation, type StationFacts } from '@/lib/run/admit-station';
import { sequences } from '@/db/seed/sequences';

const nowIso = '2026-12-01T08:00:00.000Z';
const good: StationFacts = {
  nowIso,
  meter: { code: 'DM-3', calibratedIso: '2026-03-04T00:00:00Z', validUntilIso: '2027-03-05T00:00:00Z' },
  supply: { code: 'PS-3', calibratedIso: '2026-03-04T00:00:00Z', validUntilIso: '2027-03-05T00:00:00Z' },
  dailyCheck: { atIso: '2026-12-01T06:00:00.000Z', validHours: 8, passed: true },
  commissioning: { atIso: '2026-11-12T00:00:00Z', validUntilIso: '2027-05-12T00:00:00Z', overshoot: 0.05 },
  training: { boardTypeCode: 'CB1210', validUntilIso: '2027-06-01T00:00:00Z' },
  silent: [],
  stranger: null,
  databaseAnswers: true,
  hasController: true,
  hasWiperProbe: false,
  sequence: sequences[0]!.sequence,
  sequenceErrors: 0,
};
const reasonsWith = (over: Partial<StationFacts>) => admitStation({ ...good, ...over }).reasons;

describe('a station may test', () => {
  it('when everything holds, and shows each item with its dates', () => {
    const { readiness, reasons } = admitStation(good);
    expect(reasons).toEqual([]);
    expect(readiness.every((item) => item.state === 'good')).toBe(true);
    expect(readiness.map((item) => item.key)).toEqual([
      'meter',
      'supply',
      'daily-check',
      'commissioned',
      'training',
      'links',
      'database',
    ]);
    expect(readiness[0]).toMatchObject({ label: 'DM-3', validUntil: '2027-03-05T00:00:00Z' });
  });
  it('over midnight while the hours of its daily check last', () => {
    const dailyCheck = { atIso: '2026-11-30T22:00:00.000Z', validHours: 12, passed: true };
    const { readiness, reasons } = admitStation({ ...good, dailyCheck });
    expect(reasons).toEqual([]);
    expect(readiness[2]).toMatchObject({ state: 'good', validUntil: '2026-12-01T10:00:00.000Z' });
  });
  it('with a warning when a date is near', () => {
    const { readiness, reasons } = admitStation({
      ...good,
      meter: { ...good.meter, validUntilIso: '2026-12-20T00:00:00Z' },
    });
    expect(reasons).toEqual([]);
    expect(readiness[0]).toMatchObject({ state: 'soon', sentence: { code: 'meter-calibration-soon' } });
  });
});

describe('a station is refused, with a code for the engineer', () => {
  it.each<[string, string, Partial<StationFacts>]>([
    ['C-301', 'meter-calibration-ended', { meter: { ...good.meter, validUntilIso: nowIso } }],
    ['C-302', 'supply-calibration-ended', { supply: { ...good.supply, validUntilIso: '2026-11-30T00:00:00Z' } }],
    ['C-303', 'not-calibrated', { meter: { ...good.meter, validUntilIso: null } }],
    ['C-311', 'daily-check-ended', { dailyCheck: { atIso: '2026-12-01T00:00:00.000Z', validHours: 8, passed: true } }],
    ['C-312', 'daily-check-missing', { dailyCheck: null }],
    ['C-313', 'daily-check-failed', { dailyCheck: { ...good.dailyCheck!, passed: false } }],
    ['C-321', 'commissioning-ended', { commissioning: { ...good.commissioning!, validUntilIso: nowIso } }],
    ['C-322', 'commissioning-missing', { commissioning: null }],
    ['C-323', 'overshoot-outside-search', { commissioning: { ...good.commissioning!, overshoot: 0.12 } }],
    ['T-331', 'training-ended', { training: { boardTypeCode: 'CB1210', validUntilIso: '2026-11-01T00:00:00Z' } }],
    ['T-332', 'training-missing', { training: { boardTypeCode: 'CB1210', validUntilIso: null } }],
    ['F-363', 'sequence-has-errors', { sequenceErrors: 1 }],
    ['F-361', 'needs-controller', { hasController: false }],
    ['F-362', 'needs-wiper-probe', { sequence: sequences[3]!.sequence }],
    ['L-341', 'supply-silent', { silent: ['supply'] }],
    ['L-344', 'wrong-instrument', { stranger: 'meter' }],
    ['D-351', 'database-away', { databaseAnswers: false }],
  ])('%s %s', (faultCode, code, over) => {
    expect(reasonsWith(over)).toEqual([expect.objectContaining({ faultCode, code })]);
  });
  it('for every reason at once, so that the engineer comes once', () => {
    expect(reasonsWith({ dailyCheck: null, commissioning: null }).map((r) => r.faultCode)).toEqual(['C-312', 'C-322']);
  });
});
