import { describe, expect, it } from 'vitest';
import { cb1210 } from '@/db/seed/board-types';
import { usualStation } from '@/lib/prediction/types';
import { checkSequence } from '@/lib/sequence/check-sequence';
import { changed } from './change-steps';
import { whole, type Case, tellRules } from './tell-rules';

tellRules([
  {
    problem: 'contact-check-wakes-board',
    field: 'contactCheck.volts',
    severity: 'warning',
    bad: changed(whole, 'seat', { contactCheck: { volts: 3.6, currentLimitAmps: 0.02, mostMilliohms: 5000 } }),
    good: changed(whole, 'seat', { contactCheck: { volts: 3.5, currentLimitAmps: 0.02, mostMilliohms: 5000 } }),
    says: '3.60 V',
    mend: 'Use 1.80 V',
  },
  {
    problem: 'overvoltage-above-maximum',
    field: 'overvoltageVolts',
    severity: 'error',
    bad: changed(whole, 'power-up', { overvoltageVolts: 15.5 }),
    good: changed(whole, 'power-up', { overvoltageVolts: 15 }),
    says: '15.00 V at most',
    mend: 'Use 15.00 V',
  },
  {
    problem: 'working-volts-too-low',
    field: 'volts',
    severity: 'error',
    bad: changed(whole, 'power-up', { volts: 12.5 }),
    good: changed(whole, 'power-up', { volts: 12.6 }),
    says: '12.50 V',
    mend: 'Use 13.30 V',
  },
  {
    problem: 'working-volts-too-high',
    field: 'volts',
    severity: 'error',
    bad: changed(whole, 'power-up', { volts: 14.1 }),
    good: changed(whole, 'power-up', { volts: 14.04 }),
    says: '6.8 %',
    mend: 'Use 14.04 V',
  },
  {
    problem: 'current-limit-too-low',
    field: 'currentLimitAmps',
    severity: 'error',
    bad: changed(whole, 'power-up', { currentLimitAmps: 0.09 }),
    good: changed(whole, 'power-up', { currentLimitAmps: 0.1 }),
    says: '0.09 A',
    mend: 'Use 0.11 A',
  },
  ...(['power-up', 'reference', 'output-levels', 'quiescent-current'] as const).map((kind): Case => ({
    problem: 'settle-too-short',
    field: 'settleMs',
    severity: 'error',
    bad: changed(whole, kind, { settleMs: 39 }),
    good: changed(whole, kind, { settleMs: 40 }),
    says: '39 ms is too short. The supply needs 40 ms',
    mend: 'Use 40 ms',
  })),
  ...(['find-points', 'verify'] as const).flatMap((kind): Case[] => [
    {
      problem: 'settle-too-short',
      field: 'settleMs',
      severity: 'warning',
      bad: changed(whole, kind, { settleMs: 2 }),
      good: changed(whole, kind, { settleMs: 40 }),
      says: '2 ms is too short',
      mend: 'Use 40 ms',
    },
    {
      problem: 'too-few-settles',
      field: 'mostSettles',
      severity: 'warning',
      bad: changed(whole, kind, { mostSettles: 40 }),
      good: changed(whole, kind, { mostSettles: 80 }),
      says: '40 settles',
      mend: 'Use 150',
    },
  ]),
  {
    problem: 'supply-above-maximum',
    field: 'atVolts',
    severity: 'error',
    bad: changed(whole, 'reference', { atVolts: 15.2 }),
    good: changed(whole, 'reference', { atVolts: 15 }),
    says: '15.00 V at most',
    mend: 'Use 15.00 V',
  },
  {
    problem: 'supply-above-protection',
    field: 'windowMaxVolts',
    severity: 'error',
    bad: changed(whole, 'power-up', { overvoltageVolts: 14.7 }),
    good: changed(whole, 'power-up', { overvoltageVolts: 14.8 }),
    says: '14.70 V',
    mend: 'Use 14.70 V',
  },
  {
    problem: 'supply-above-maximum',
    field: 'windowMaxVolts',
    severity: 'error',
    bad: changed(whole, 'find-points', { windowMaxVolts: 15.2 }),
    good: changed(whole, 'find-points', { windowMaxVolts: 15 }),
    says: '15.20 V',
    mend: 'Use 15.00 V',
  },
  {
    problem: 'window-misses-limits',
    field: 'windowMinVolts',
    severity: 'error',
    bad: changed(whole, 'find-points', { windowMinVolts: 10.8 }),
    good: changed(whole, 'find-points', { windowMinVolts: 8 }),
    says: '10.70 V',
    mend: 'Use 7.00 V',
  },
  {
    problem: 'window-too-narrow',
    field: 'windowMinVolts',
    severity: 'warning',
    bad: changed(whole, 'find-points', { windowMinVolts: 9 }),
    good: changed(whole, 'find-points', { windowMinVolts: 8 }),
    says: '8.10 V',
    mend: 'Use 7.00 V',
  },
  {
    problem: 'window-misses-limits',
    field: 'windowMaxVolts',
    severity: 'error',
    bad: changed(whole, 'find-points', { windowMaxVolts: 12.5 }),
    good: changed(whole, 'find-points', { windowMaxVolts: 12.6 }),
    says: '12.50 V',
    mend: 'Use 15.00 V',
  },
]);

describe('a station', () => {
  it('with a larger overshoot lowers the working supply that is right', () => {
    const wild = { ...usualStation, commissioning: { ...usualStation.commissioning, overshoot: 0.08 } };
    const sequence = changed(whole, 'power-up', { volts: 13.9 });
    expect(checkSequence(sequence, cb1210, wild)).toMatchObject([{ problem: 'working-volts-too-high' }]);
    expect(checkSequence(sequence, cb1210, usualStation)).toEqual([]);
  });
  it('that settles slower needs longer settling', () => {
    const slow = { ...usualStation, commissioning: { ...usualStation.commissioning, settleMs: 70 } };
    expect(checkSequence(whole, cb1210, slow).map(({ severity, sentence }) => [severity, sentence])).toContainEqual([
      'error',
      '60 ms is too short. The supply needs 70 ms to settle.',
    ]);
  });
});
