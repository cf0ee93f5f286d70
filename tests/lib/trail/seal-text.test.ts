import fc from 'fast-check';
import { expect, test } from 'vitest';
import { sealText, type SealedFields } from '@/lib/trail/seal-text';

const text = fc.string({ unit: 'binary' });
const fields: fc.Arbitrary<SealedFields> = fc.record({
  chain: text,
  place: fc.nat(),
  at: text,
  accountId: fc.option(text),
  stationId: fc.option(text),
  action: text,
  entity: text,
  entityId: text,
  before: fc.option(text),
  after: fc.option(text),
  reason: fc.option(text),
});

test('two different entries never share the text that is sealed', () => {
  fc.assert(
    fc.property(fields, fields, fc.option(text), fc.option(text), (a, b, beforeA, beforeB) => {
      const same = JSON.stringify([beforeA, a]) === JSON.stringify([beforeB, b]);
      expect(sealText(beforeA, a) === sealText(beforeB, b)).toBe(same);
    }),
  );
});

test('a value moved from one field to the next, or a null made empty, changes the text', () => {
  const entry: SealedFields = {
    chain: 'desk',
    place: 1,
    at: '2026-12-01T09:30:00.000000Z',
    accountId: null,
    stationId: null,
    action: 'lot.held',
    entity: 'lot',
    entityId: 'x',
    before: null,
    after: null,
    reason: null,
  };
  const plain = sealText(null, entry);
  expect(sealText(null, { ...entry, reason: '' })).not.toBe(plain);
  expect(sealText(null, { ...entry, entity: 'lo', entityId: 'tx' })).not.toBe(plain);
  expect(sealText('', entry)).not.toBe(plain);
  expect(plain.startsWith('sillwright trail 1\n-\n4:desk\n1:1\n')).toBe(true);
});
