import { describe, expect, it } from 'vitest';
import { cb1210 } from '@/db/seed/board-types';
import { sequences } from '@/db/seed/sequences';
import type { BoardType } from '@/lib/contracts/board-type';
import { checkSequence } from '@/lib/sequence/check-sequence';
import { changed } from './change-steps';
import { fullSpan, limits, whole, tellRules } from './tell-rules';

tellRules([
  {
    problem: 'target-outside-limits',
    field: 'targetVolts',
    severity: 'error',
    bad: changed(whole, 'trim', { targetVolts: 10.879 }),
    good: changed(whole, 'trim', { targetVolts: 10.877 }),
    says: 'less a guard of',
    mend: 'Use 10.878 V',
  },
  {
    problem: 'tolerance-wider-than-limits',
    field: 'toleranceVolts',
    severity: 'error',
    bad: changed(whole, 'trim', { toleranceVolts: 0.12 }),
    good: changed(whole, 'trim', { toleranceVolts: 0.095 }),
    says: '±120 mV',
    mend: 'Use 98 mV',
  },
  {
    problem: 'target-outside-travel',
    field: 'targetVolts',
    severity: 'error',
    bad: changed(whole, 'trim', { targetVolts: 7.5 }),
    good: changed(whole, 'trim', { targetVolts: 10.8 }),
    says: '7.50 V',
    mend: null,
  },
  {
    problem: 'tolerance-finer-than-trimmer',
    field: 'toleranceVolts',
    severity: 'error',
    bad: sequences[2]!.sequence,
    good: changed(sequences[2]!.sequence, 'trim', { toleranceVolts: 0.101 }),
    says: 'A screw of 270 degrees',
    mend: 'Use 101 mV',
    boardType: fullSpan,
  },
  {
    problem: 'tolerance-finer-than-uncertainty',
    field: 'toleranceVolts',
    severity: 'error',
    bad: changed(whole, 'trim', { toleranceVolts: 0.0014 }),
    good: changed(whole, 'trim', { toleranceVolts: 0.002 }),
    says: '±1.4 mV',
    mend: 'Use 2 mV',
  },
  {
    problem: 'release-outside-at-target',
    field: 'targetVolts',
    severity: 'warning',
    bad: whole,
    good: whole,
    says: '12.30 V to 12.50 V',
    mend: null,
    boardType: limits({ releaseVolts: { min: 12.3, max: 12.5 } }),
  },
  {
    problem: 'guard-leaves-nothing',
    field: 'wantedUncertaintyVolts',
    severity: 'error',
    bad: changed(whole, 'verify', { wantedUncertaintyVolts: 0.2 }),
    good: changed(whole, 'verify', { wantedUncertaintyVolts: 0.002 }),
    says: 'Nothing passes',
    mend: null,
  },
  {
    problem: 'spread-below-scatter',
    field: 'mostSpreadVolts',
    severity: 'warning',
    bad: changed(whole, 'verify', { mostSpreadVolts: 0.004 }),
    good: changed(whole, 'verify', { mostSpreadVolts: 0.0042 }),
    says: '4.2 mV',
    mend: 'Use 4.2 mV',
  },
  {
    problem: 'ride-through-not-between-points',
    field: 'atVolts',
    severity: 'error',
    bad: changed(whole, 'ride-through', { atVolts: 12.1 }),
    good: changed(whole, 'ride-through', { atVolts: 12.09 }),
    says: '10.90 V to 12.10 V',
    mend: 'Use 11.98 V',
  },
  {
    problem: 'ride-through-too-short',
    field: 'milliseconds',
    severity: 'error',
    bad: changed(whole, 'ride-through', { milliseconds: 9.9 }),
    good: changed(whole, 'ride-through', { milliseconds: 10 }),
    says: '9.9 ms',
    mend: 'Use 10 ms',
  },
  {
    problem: 'ride-through-beyond-reservoir',
    field: 'milliseconds',
    severity: 'warning',
    bad: changed(whole, 'ride-through', { milliseconds: 18 }),
    good: changed(whole, 'ride-through', { milliseconds: 17 }),
    says: '18 ms is long',
    mend: 'Use 17.3 ms',
  },
]);

describe('limits of a board type', () => {
  const problems = (boardType: BoardType) => checkSequence(whole, boardType).map(({ problem }) => problem);
  it('put release above trip', () => {
    expect(problems(limits({ releaseVolts: { min: 10, max: 10.7 } }))).toContain('release-not-above-trip');
    expect(problems(limits({ releaseVolts: { min: 10.85, max: 12.5 } }))).toContain('release-limits-overlap');
    expect(problems(cb1210)).toEqual([]);
  });
});
