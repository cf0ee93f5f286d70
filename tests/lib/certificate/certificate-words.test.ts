import { expect, test } from 'vitest';
import { clockWords, instrumentWords, lotSentence, ruleSentence } from '@/lib/certificate/certificate-words';
import type { CertificateContent } from '@/lib/contracts/certificate';

test('one board is told apart from many', () => {
  const counts = { boards: 3, firstPass: 1, laterPass: 0, concessions: 1, apart: 1 };
  expect(lotSentence({ boardTypeCode: 'CB1210', counts } as CertificateContent)).toBe(
    '3 boards of CB1210 were made in this lot. 1 met all limits the first time. 1 board is used as it is, by concession. ' +
      '1 board is not covered by this certificate. Each board covered is listed with its values.',
  );
});

test('a moment names its zone', () => {
  expect(clockWords('2026-07-01T11:38:00Z', 'UTC')).toBe('11:38 UTC');
});

test('an instrument without a calibration on record says so; a fixture controller measures nothing', () => {
  const none = { code: 'X-1', serial: null, calibratedOn: null, calibratedUntil: null, certificateNumber: null };
  expect(instrumentWords({ role: 'multimeter', ...none })).toBe('Multimeter X-1, no calibration on record.');
  expect(instrumentWords({ role: 'fixture-controller', ...none })).toBe('Fixture controller X-1.');
});

test('the decision rule is said with its guard band', () => {
  expect(ruleSentence({ kind: 'simple' })).toContain('(simple acceptance)');
  expect(ruleSentence({ kind: 'guard-band', factor: 1 })).toContain('a guard band of its U.');
  expect(ruleSentence({ kind: 'guard-band', factor: 0.8 })).toContain('0.8 times its U.');
});
