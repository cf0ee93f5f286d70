import { describe, expect, test } from 'vitest';
import type { CertificateContent, CertifiedValue } from '@/lib/contracts/certificate';
import { certificatePdf, type PrintedCertificate } from '@/server/files/certificates/certificate-pdf';
import { printable } from '@/server/files/pdf/faces';
import { readCode128, readQrCodes } from '../../lib/barcode/read-barcode';
import { readPdf } from './read-pdf';

const serial = 'CB1210264800042';
const value = (over: Partial<CertifiedValue> & Pick<CertifiedValue, 'quantity' | 'value'>): CertifiedValue => ({
  step: '',
  expandedUncertainty: 0.0024,
  coverageFactor: 2.01,
  min: null,
  max: null,
  passed: true,
  ...over,
});
const content: CertificateContent = {
  kind: 'board',
  boardTypeCode: 'CB1210',
  boardTypeName: 'Undervoltage cutoff, 12 V 10 A',
  sequenceName: 'End of line',
  lotCode: '2648-B',
  benches: [
    {
      stationCode: 'S3',
      fixture: 'F2',
      instruments: [
        {
          role: 'multimeter',
          code: 'DM-3',
          serial: '100303',
          calibratedOn: '2026-04-19',
          calibratedUntil: '2027-04-19',
          certificateNumber: 'K-4712',
        },
      ],
    },
  ],
  procedures: [{ sequenceRevision: 'r6', decisionRule: 'A result passes when it lies inside its limits.' }],
  boards: [
    {
      serial,
      runId: 'r',
      testedAtIso: '2026-11-25T11:38:00Z',
      attempt: 2,
      operatorNumber: '27',
      bench: 0,
      procedure: 0,
      values: [
        value({ quantity: 'trip-volts', value: 10.81234, min: 10.7, max: 10.9 }),
        value({ quantity: 'release-volts', value: 12.2344, min: 12.1, max: 12.5 }),
        value({ quantity: 'hysteresis-volts', value: 1.4221, min: 1.2, max: 1.7 }),
      ],
      earlier: [{ attempt: 1, reason: 'release-too-high', reworked: 'Part R14 was changed, 4.7 kΩ' }],
      concession: null,
    },
  ],
  counts: null,
};
const printed: PrintedCertificate = {
  number: '2648-B-00042-2',
  content,
  issuedIso: '2026-11-26T11:20:00Z',
  issuedByName: 'A. Boyle',
  seal: '6b82fe01',
  verifyUrl: 'https://calibration.haldonmere.example/verify/AbCdEfGhIjKlMnOpQrStUv',
  timeZone: 'UTC',
};

describe('the paper of a certificate', () => {
  test('is one A4 page whose words and codes an independent reader finds', async () => {
    const [page, ...more] = await readPdf(await certificatePdf(printed));
    expect(more).toEqual([]);
    for (const said of [
      'Certificate 2648-B-00042-2, page 1 of 1',
      'Attempt 1 was rejected: release point too high. Rework: part R14 was changed, 4.7 kohm.',
      '10.70–10.90 10.8123 0.0024 2.01',
      'Multimeter DM-3, no. 100303, calibrated 19 April 2026, until 19 April 2027, certificate K-4712.',
      'Site rules, local codes and licensed practice come first.',
    ])
      expect(page!.text).toContain(said);
    expect(await readCode128(page!.picture())).toEqual([serial]);
    expect(await readQrCodes(page!.picture())).toEqual([printed.verifyUrl]);
  });

  test('in grey its codes read as well', async () => {
    const [page] = await readPdf(await certificatePdf(printed));
    const grey = () => page!.picture().flatten({ background: '#fff' }).modulate({ saturation: 0 });
    expect(await readCode128(grey())).toEqual([serial]);
    expect(await readQrCodes(grey())).toEqual([printed.verifyUrl]);
  });

  test('is the same to the byte for the same content, says its title and is tagged', async () => {
    const [first, second] = await Promise.all([certificatePdf(printed), certificatePdf(printed)]);
    expect(first.equals(second)).toBe(true);
    const source = first.toString('latin1');
    expect(source).toContain('(Certificate 2648-B-00042-2)');
    expect(source).toContain('/Marked true');
    expect(source).toContain('/Lang (en-GB)');
    // Our faces, embedded: nothing is left to the reader's own.
    expect(source.match(/\/FontFile[23]/g)!.length).toBeGreaterThanOrEqual(4);
  });

  test('goes on over more pages where there is much to say, and loses nothing', async () => {
    const board = content.boards[0]!;
    const steps = Array.from({ length: 60 }, (_, i) =>
      value({ quantity: 'channel-volts', step: `Channel check ${i + 1}`, value: 5 + i / 100, min: 4, max: 6 }),
    );
    const reworked = 'The part was changed, the joint was made anew and cleaned, the trimmer was turned back. '.repeat(
      3,
    );
    const earlier = [1, 2, 3].map((attempt) => ({ attempt, reason: 'release-too-high' as const, reworked }));
    const long = { ...board, attempt: 4, earlier, values: [...board.values, ...steps] };
    const pages = await readPdf(await certificatePdf({ ...printed, content: { ...content, boards: [long] } }));
    expect(pages.length).toBeGreaterThan(1);
    const text = pages.map((page) => page.text).join(' ');
    for (const { step } of steps) expect(text).toContain(step);
    expect(text).toContain(`page ${pages.length} of ${pages.length}`);
    expect(await readQrCodes(pages[0]!.picture())).toEqual([printed.verifyUrl]);
  });
});

test.each([
  ['Łukasz Müller, 4.7 kΩ', 'Lukasz Müller, 4.7 kohm'],
  ['Dvořák ≤ 5 µA', 'Dvorák max 5 uA'],
  ['板 5', '? 5'],
])('%s is printed in letters that the faces have', (given, said) => {
  expect(printable(given)).toBe(said);
});
