import type { Database, Transaction } from '@/db/client';
import { listNumbers } from '@/db/queries/certificates';
import { findCertificateLot } from '@/db/queries/certificate-lots';
import { listUnitRecordsById, listUnitRecordsOfLot } from '@/db/queries/unit-records';
import { isCertifiable, lotCertificateProblem } from '@/lib/certificate/certifiable';
import { nextNumber, numberStem } from '@/lib/certificate/certificate-number';
import type { CertificateContent } from '@/lib/contracts/certificate';
import { refusal, success, type Outcome } from '@/lib/contracts/outcome';
import { certificateContent } from './certificate-content';

export type CertificateSubject = { unitId: string } | { lotId: string };

export interface PreparedCertificate {
  unitId: string | null;
  lotId: string;
  number: string;
  content: CertificateContent;
}

/**
 * What a certificate would state now, with the number it would get. Codes: unit-unknown, lot-unknown, lot-held, board-not-passed,
 * lot-not-complete, nothing-passed.
 */
export async function prepareCertificate(
  db: Database | Transaction,
  subject: CertificateSubject,
): Promise<Outcome<PreparedCertificate>> {
  const ofUnit = 'unitId' in subject;
  const lot = await findCertificateLot(db, subject);
  if (!lot)
    return ofUnit
      ? refusal('unit-unknown', 'This board does not exist.')
      : refusal('lot-unknown', 'This lot does not exist.');
  if (lot.heldAt)
    return refusal(
      'lot-held',
      `Lot ${lot.code} is on hold: ${lot.holdReason} No certificate leaves until it is released.`,
    );
  const records = await (ofUnit ? listUnitRecordsById(db, [subject.unitId]) : listUnitRecordsOfLot(db, lot.id));
  if (ofUnit && !isCertifiable(records[0]!))
    return refusal(
      'board-not-passed',
      'The newest result of this board is not a pass, and no complete concession stands for it. It gets no certificate.',
    );
  const problem = ofUnit ? null : lotCertificateProblem(lot.state, records);
  if (problem === 'lot-not-complete')
    return refusal(problem, `Lot ${lot.code} is not complete. Finish its boards, or close it first.`);
  if (problem) return refusal(problem, `No board of lot ${lot.code} has passed. There is nothing to certify.`);
  const stem = numberStem(lot.code, ofUnit ? records[0]!.serial : null);
  const number = nextNumber(stem, await listNumbers(db, stem));
  const { code: lotCode, boardTypeCode, boardTypeName, sequenceName } = lot;
  const heading = { kind: ofUnit ? 'board' : 'lot', boardTypeCode, boardTypeName, sequenceName, lotCode } as const;
  const content = await certificateContent(db, heading, records);
  return success({ unitId: ofUnit ? subject.unitId : null, lotId: lot.id, number, content });
}
