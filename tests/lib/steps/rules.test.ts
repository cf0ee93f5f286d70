import { describe, expect, it } from 'vitest';
import { cb0612, cb1210 } from '@/db/seed/board-types';
import { sequences } from '@/db/seed/sequences';
import type { BoardType } from '@/lib/contracts/board-type';
import { usualStation } from '@/lib/prediction/types';
import { checkSequence } from '@/lib/sequence/check-sequence';
import type { StationKind } from '@/lib/sequence/station-kind';
import { sequenceSchema, type DecisionRule, type Sequence, type Step } from '@/lib/sequence/step';
import { applied, before, changed, without } from './change-steps';

const whole = sequences[0]!.sequence;
const measure = {
  id: 'm1',
  name: '',
  enabled: true,
  kind: 'measure-channel',
  channel: 102,
  atVolts: 13,
  settleMs: 60,
  integrationCycles: 1,
  minVolts: 11,
  maxVolts: 13,
} as const satisfies Step;
const apply = { id: 'a1', name: '', enabled: true, kind: 'apply-voltage', volts: 12, waitMs: 500 } as const;
const soak = {
  id: 'k1',
  name: '',
  enabled: true,
  kind: 'soak',
  channel: 103,
  atVolts: 13,
  readings: 20,
  everyMs: 500,
  mostDriftVolts: 0.005,
} as const satisfies Step;
const tell = {
  id: 'i1',
  name: '',
  enabled: true,
  kind: 'instruction',
  text: 'Fit the clip.',
  pictureId: null,
  supplyOff: true,
} as const satisfies Step;
const branch = {
  id: 'b1',
  name: '',
  enabled: true,
  kind: 'branch',
  quantity: 'trip-volts',
  is: 'below',
  value: 10.7,
  goTo: 's4',
  mostTimes: 2,
} as const satisfies Step;
const idOf = (kind: Step['kind']) => whole.steps.find((s) => s.kind === kind)!.id;
const within = (step: Step) => before(whole, 'record', step);
const back = before(whole, 'output-levels', branch);

interface Case {
  problem: string;
  field: string | null;
  severity: 'error' | 'warning';
  bad: Sequence;
  /** The nearest that is right. */
  good: Sequence;
  /** Words that the sentence has: its numbers. */
  says: string;
  /** Null: no single value puts it right. */
  mend: string | null;
  boardType?: BoardType;
  station?: StationKind;
}
const rule = (decisionRule: DecisionRule, sequence = whole): Sequence => ({ ...sequence, decisionRule });
const limits = (over: Partial<BoardType['limits']>): BoardType => ({
  ...cb1210,
  limits: { ...cb1210.limits, ...over },
});
const fullSpan: BoardType = {
  ...cb0612,
  design: { ...cb0612.design, trimmerOhms: 10_000, supplyEndOhms: 0, groundEndOhms: 0 },
  limits: { ...cb0612.limits, tripVolts: { min: 10.8, max: 11.2 } },
};

const cases: Case[] = [
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
  {
    problem: 'supply-above-maximum',
    field: 'atVolts',
    severity: 'error',
    bad: within({ ...measure, atVolts: 16 }),
    good: within(measure),
    says: '16.00 V',
    mend: 'Use 15.00 V',
  },
  {
    problem: 'settle-too-short',
    field: 'settleMs',
    severity: 'error',
    bad: within({ ...measure, settleMs: 50, integrationCycles: 10 }),
    good: within({ ...measure, settleMs: 52, integrationCycles: 10 }),
    says: 'before a reading over 10 cycles',
    mend: 'Use 52 ms',
  },
  {
    problem: 'integration-below-a-cycle',
    field: 'integrationCycles',
    severity: 'warning',
    bad: within({ ...measure, integrationCycles: 0.2 }),
    good: within(measure),
    says: '0.2 of a power-line cycle',
    mend: 'Use 1 cycle',
  },
  {
    problem: 'channel-without-limits',
    field: 'minVolts',
    severity: 'warning',
    bad: within({ ...measure, minVolts: null, maxVolts: null }),
    good: within({ ...measure, minVolts: null }),
    says: 'every board passes',
    mend: null,
  },
  {
    problem: 'channel-limits-crossed',
    field: 'maxVolts',
    severity: 'error',
    bad: within({ ...measure, minVolts: 13, maxVolts: 11 }),
    good: within(measure),
    says: '13.00 V',
    mend: 'Swap them',
  },
  {
    problem: 'guard-leaves-nothing',
    field: 'maxVolts',
    severity: 'error',
    bad: within({ ...measure, minVolts: 12, maxVolts: 12.001 }),
    good: within({ ...measure, minVolts: 12, maxVolts: 12.003 }),
    says: 'Nothing passes',
    mend: null,
  },
  {
    problem: 'supply-above-maximum',
    field: 'volts',
    severity: 'error',
    bad: within({ ...apply, volts: 15.1 }),
    good: within({ ...apply, volts: 15 }),
    says: '15.10 V',
    mend: 'Use 15.00 V',
  },
  {
    problem: 'wait-long',
    field: 'waitMs',
    severity: 'warning',
    bad: within({ ...apply, waitMs: 660_000 }),
    good: within({ ...apply, waitMs: 600_000 }),
    says: '11 min',
    mend: null,
  },
  {
    problem: 'interval-too-short',
    field: 'everyMs',
    severity: 'error',
    bad: within({ ...soak, everyMs: 50 }),
    good: within({ ...soak, everyMs: 60 }),
    says: '50 ms',
    mend: 'Use 60 ms',
  },
  {
    problem: 'soak-short',
    field: 'everyMs',
    severity: 'warning',
    bad: within({ ...soak, readings: 5, everyMs: 200 }),
    good: within({ ...soak, readings: 5, everyMs: 250 }),
    says: '800 ms',
    mend: 'Use 250 ms',
  },
  {
    problem: 'soak-long',
    field: 'everyMs',
    severity: 'warning',
    bad: within({ ...soak, everyMs: 60_000 }),
    good: within({ ...soak, everyMs: 30_000 }),
    says: '19 min',
    mend: null,
  },
  {
    problem: 'drift-finer-than-uncertainty',
    field: 'mostDriftVolts',
    severity: 'error',
    bad: within({ ...soak, mostDriftVolts: 0.00005 }),
    good: within({ ...soak, mostDriftVolts: 0.0004 }),
    says: 'is too fine',
    mend: 'Use 0.4 mV',
  },
  {
    problem: 'drift-finer-than-uncertainty',
    field: 'mostDriftVolts',
    severity: 'warning',
    bad: rule({ kind: 'simple' }, within({ ...soak, mostDriftVolts: 0.00005 })),
    good: within({ ...soak, mostDriftVolts: 0.0004 }),
    says: 'is too fine',
    mend: 'Use 0.4 mV',
  },
  {
    problem: 'instruction-with-supply-on',
    field: 'supplyOff',
    severity: 'warning',
    bad: within({ ...tell, supplyOff: false }),
    good: before(whole, 'power-up', { ...tell, supplyOff: false }),
    says: 'stays on',
    mend: 'Switch it off first',
  },
  {
    problem: 'branch-never-measured',
    field: 'quantity',
    severity: 'error',
    bad: before(whole, 'output-levels', { ...branch, quantity: 'drift-volts' }),
    good: back,
    says: 'measures the drift',
    mend: null,
  },
  {
    problem: 'branch-to-itself',
    field: 'goTo',
    severity: 'error',
    bad: changed(back, 'branch', { goTo: 'b1' }),
    good: back,
    says: 'to itself',
    mend: null,
  },
  {
    problem: 'branch-target-missing',
    field: 'goTo',
    severity: 'error',
    bad: changed(back, 'branch', { goTo: 'gone' }),
    good: back,
    says: 'leads nowhere',
    mend: null,
  },
  {
    problem: 'branch-target-disabled',
    field: 'goTo',
    severity: 'error',
    bad: changed(back, 'find-points', { enabled: false }),
    good: back,
    says: 'is not run',
    mend: 'Run that step',
  },
  {
    problem: 'branch-restarts',
    field: 'goTo',
    severity: 'error',
    bad: changed(back, 'branch', { goTo: idOf('seat') }),
    good: back,
    says: 'not powered up',
    mend: 'Use reference',
  },
  {
    problem: 'branch-goes-round',
    field: 'mostTimes',
    severity: 'error',
    bad: before(
      before(changed(back, 'branch', { mostTimes: 5 }), 'quiescent-current', { ...branch, id: 'b2', mostTimes: 5 }),
      'ride-through',
      { ...branch, id: 'b3', mostTimes: 1 },
    ),
    good: before(changed(back, 'branch', { mostTimes: 5 }), 'quiescent-current', { ...branch, id: 'b2', mostTimes: 5 }),
    says: '72 times',
    mend: 'Use 1',
  },
  {
    problem: 'branch-leaves-out',
    field: 'goTo',
    severity: 'error',
    bad: before(whole, 'trim', { ...branch, goTo: idOf('output-levels') }),
    good: before(whole, 'trim', { ...branch, goTo: idOf('verify') }),
    says: 'leaves out verify',
    mend: 'Use verify',
  },
  {
    problem: 'branch-leaves-out',
    field: 'goTo',
    severity: 'error',
    bad: before(whole, 'seal', { ...branch, goTo: idOf('verify') }),
    good: before(whole, 'trim', { ...branch, goTo: idOf('verify') }),
    says: 'leaves out seal',
    mend: 'Use seal',
  },
  {
    problem: 'branch-leaves-out-checks',
    field: 'goTo',
    severity: 'warning',
    bad: before(whole, 'output-levels', { ...branch, goTo: idOf('operator-check') }),
    good: before(whole, 'output-levels', { ...branch, goTo: idOf('output-levels') }),
    says: 'output levels, quiescent current and ride through',
    mend: null,
  },
  {
    problem: 'seat-not-first',
    field: null,
    severity: 'error',
    bad: changed(whole, 'seat', { enabled: false }),
    good: whole,
    says: 'Nothing seats the board',
    mend: 'Run seat',
  },
  {
    problem: 'power-up-missing',
    field: null,
    severity: 'error',
    bad: before(whole, 'power-up', measure),
    good: before(whole, 'power-up', tell),
    says: 'before anything is measured',
    mend: null,
  },
  {
    problem: 'power-up-missing',
    field: null,
    severity: 'error',
    bad: changed(whole, 'power-up', { enabled: false }),
    good: whole,
    says: 'Nothing powers',
    mend: 'Run power up',
  },
  {
    problem: 'record-not-last',
    field: null,
    severity: 'error',
    bad: changed(whole, 'record', { enabled: false }),
    good: whole,
    says: 'Nothing switches the supply off',
    mend: 'Run record',
  },
  {
    problem: 'record-not-last',
    field: null,
    severity: 'error',
    bad: { ...whole, steps: [...whole.steps, tell] },
    good: { ...whole, steps: [...whole.steps, { ...tell, enabled: false }] },
    says: 'comes last',
    mend: null,
  },
  {
    problem: 'verify-missing',
    field: null,
    severity: 'error',
    bad: changed(whole, 'verify', { enabled: false }),
    good: whole,
    says: 'no board can pass',
    mend: 'Run verify',
  },
  {
    problem: 'trim-not-verified',
    field: null,
    severity: 'error',
    bad: before(
      without(whole, 'verify'),
      'trim',
      whole.steps.find(({ kind }) => kind === 'verify')!,
    ),
    good: whole,
    says: 'Verify again',
    mend: null,
  },
  {
    problem: 'find-missing',
    field: null,
    severity: 'error',
    bad: changed(whole, 'find-points', { enabled: false }),
    good: without(whole, 'find-points', 'trim', 'seal'),
    says: 'nothing has found',
    mend: 'Run find points',
  },
  {
    problem: 'trim-not-sealed',
    field: null,
    severity: 'warning',
    bad: without(whole, 'seal'),
    good: whole,
    says: 'not sealed',
    mend: null,
  },
  {
    problem: 'step-repeated',
    field: null,
    severity: 'error',
    bad: before(whole, 'trim', { ...whole.steps[1]!, id: 'again' }),
    good: before(whole, 'trim', { ...whole.steps[1]!, id: 'again', enabled: false }),
    says: 'one power up',
    mend: null,
  },
  {
    problem: 'step-id-not-unique',
    field: null,
    severity: 'error',
    bad: within({ ...measure, id: 's1' }),
    good: within(measure),
    says: 'the id s1',
    mend: null,
  },
  {
    problem: 'nothing-enabled',
    field: null,
    severity: 'error',
    bad: { ...whole, steps: whole.steps.map((step) => ({ ...step, enabled: false })) },
    good: whole,
    says: 'No step is run',
    mend: null,
  },
  {
    problem: 'guard-below-uncertainty',
    field: null,
    severity: 'warning',
    bad: rule({ kind: 'guard-band', factor: 0.83 }),
    good: rule({ kind: 'guard-band', factor: 1 }),
    says: '0.83 U',
    mend: null,
  },
  {
    problem: 'guard-missing',
    field: null,
    severity: 'warning',
    bad: changed(rule({ kind: 'simple' }), 'verify', { wantedUncertaintyVolts: 0.04 }),
    good: rule({ kind: 'simple' }),
    says: 'no guard',
    mend: null,
  },
];

const found = ({ problem, field, boardType = cb1210, station = usualStation }: Case, sequence: Sequence) =>
  checkSequence(sequence, boardType, station).filter((f) => f.problem === problem && f.field === field);

describe.each(cases.map((each) => [`${each.problem} of ${each.field ?? 'a step'}`, each] as const))('%s', (_, each) => {
  const [finding] = found(each, each.bad);
  it('is told where it is wrong, with its numbers', () => {
    expect(sequenceSchema.safeParse(each.bad).success).toBe(true);
    expect(finding).toMatchObject({ severity: each.severity, field: each.field });
    expect(finding!.sentence).toContain(each.says);
  });
  it('is not told where it is right', () => {
    const boardType = each.problem === 'release-outside-at-target' ? cb1210 : each.boardType;
    expect(found({ ...each, ...(boardType ? { boardType } : {}) }, each.good)).toEqual([]);
  });
  it('is put right by its mend, which leaves no new error', () => {
    expect(finding?.mend?.label ?? null).toBe(each.mend);
    if (!finding?.mend) return;
    const mended = applied(each.bad, finding.mend.changes);
    expect(sequenceSchema.safeParse(mended).success).toBe(true);
    expect(found(each, mended).filter(({ stepId }) => stepId === finding.stepId)).toEqual([]);
    const errors = (sequence: Sequence) =>
      checkSequence(sequence, each.boardType ?? cb1210).filter(({ severity }) => severity === 'error');
    expect(errors(mended).length).toBeLessThanOrEqual(errors(each.bad).length);
  });
});

describe('limits of a board type', () => {
  const problems = (boardType: BoardType) => checkSequence(whole, boardType).map(({ problem }) => problem);
  it('put release above trip', () => {
    expect(problems(limits({ releaseVolts: { min: 10, max: 10.7 } }))).toContain('release-not-above-trip');
    expect(problems(limits({ releaseVolts: { min: 10.85, max: 12.5 } }))).toContain('release-limits-overlap');
    expect(problems(cb1210)).toEqual([]);
  });
});

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
