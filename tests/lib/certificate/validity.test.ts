import { expect, test } from 'vitest';
import { certificateValidity, type CertificateFate } from '@/lib/certificate/validity';

const nothing: CertificateFate = {
  revoked: null,
  newerIso: null,
  testedAgainIso: null,
  lotHeld: false,
  boardWaits: false,
};
const all: CertificateFate = {
  revoked: { atIso: '2026-12-01T08:00:00Z', reason: 'Wrong limit.' },
  newerIso: '2026-12-02T08:00:00Z',
  testedAgainIso: '2026-12-03T08:00:00Z',
  lotHeld: true,
  boardWaits: true,
};

test('a certificate to which nothing happened is valid', () => {
  expect(certificateValidity(nothing)).toEqual({ kind: 'valid' });
});

test('what ends it for good is said before what may pass', () => {
  expect(certificateValidity(all)).toMatchObject({ kind: 'revoked', reason: 'Wrong limit.' });
  expect(certificateValidity({ ...all, revoked: null })).toMatchObject({
    kind: 'replaced',
    because: 'newer-certificate',
  });
  expect(certificateValidity({ ...all, revoked: null, newerIso: null })).toMatchObject({
    kind: 'replaced',
    because: 'tested-again',
  });
  expect(certificateValidity({ ...nothing, lotHeld: true, boardWaits: true })).toEqual({
    kind: 'under-review',
    because: 'lot-held',
  });
  expect(certificateValidity({ ...nothing, boardWaits: true })).toEqual({
    kind: 'under-review',
    because: 'board-waits',
  });
});
