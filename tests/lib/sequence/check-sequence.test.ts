import { describe, expect, it } from 'vitest';
import { boardTypes, cb1210 } from '@/db/seed/board-types';
import { sequences } from '@/db/seed/sequences';
import { checkSequence, missingEquipment } from '@/lib/sequence/check-sequence';
import { sequenceSchema, type Sequence, type Step } from '@/lib/sequence/step';

const whole = sequences[0]!.sequence;
const problems = (sequence: Sequence) => checkSequence(sequence, cb1210).map((finding) => finding.problem);
const without = (kind: Step['kind']): Sequence => ({ ...whole, steps: whole.steps.filter((s) => s.kind !== kind) });
const changed = (kind: Step['kind'], over: object): Sequence => ({
  ...whole,
  steps: whole.steps.map((s) => (s.kind === kind ? ({ ...s, ...over } as Step) : s)),
});

describe('a sequence', () => {
  it.each(sequences.map((s) => [s.name, s] as const))('%s of the demo has no problem', (_name, seed) => {
    const boardType = boardTypes.find((type) => type.code === seed.boardTypeCode)!;
    expect(sequenceSchema.safeParse(seed.sequence).success).toBe(true);
    expect(checkSequence(seed.sequence, boardType)).toEqual([]);
  });
  it.each<[string, Sequence]>([
    ['seat-not-first', without('seat')],
    ['record-not-last', without('record')],
    ['verify-missing', without('verify')],
    ['find-missing', without('find-points')],
    ['working-volts-too-low', changed('power-up', { volts: 12.4 })],
    ['working-volts-too-high', changed('power-up', { volts: 14.5 })],
    ['overvoltage-above-maximum', changed('power-up', { overvoltageVolts: 15.5 })],
    ['supply-above-maximum', changed('find-points', { windowMaxVolts: 15.2 })],
    ['window-too-narrow', changed('find-points', { windowMinVolts: 9 })],
    ['target-outside-limits', changed('trim', { targetVolts: 10.89 })],
    ['ride-through-not-between-points', changed('ride-through', { atVolts: 12.6 })],
    ['ride-through-too-short', changed('ride-through', { milliseconds: 5 })],
  ])('is told %s', (problem, sequence) => {
    expect(problems(sequence)).toContain(problem);
  });
  it('that trims without verifying afterwards is told so', () => {
    const steps = [...without('verify').steps];
    steps.splice(
      3,
      0,
      whole.steps.find((s) => s.kind === 'verify')!,
    );
    expect(problems({ ...whole, steps })).toContain('trim-not-verified');
  });
  it('with ride-through needs a fixture controller, by wiper probe that probe', () => {
    expect(missingEquipment(whole, { hasController: false, hasWiperProbe: false })).toEqual(['fixture-controller']);
    expect(missingEquipment(sequences[3]!.sequence, { hasController: true, hasWiperProbe: false })).toEqual([
      'wiper-probe',
    ]);
    expect(missingEquipment(without('ride-through'), { hasController: false, hasWiperProbe: false })).toEqual([]);
  });
});
