import { SerialStrip } from '@/components/ui/serial-strip';
import {
  boardSentence,
  cautionSentences,
  clockWords,
  dayWords,
  lotSentence,
} from '@/lib/certificate/certificate-words';
import { valueText } from '@/lib/certificate/value-text';
import type { VerifiedCertificate as Verified } from '@/lib/contracts/certificate';
import { Advice, callTheMaker } from './advice';
import { validitySaid } from './validity-words';
import { VerifiedBoards } from './verified-boards';
import { VerifiedRails } from './verified-rails';
import { VerifiedValues } from './verified-values';
import { VerifyFrame } from './verify-frame';

interface Props {
  certificate: Verified;
  timeZone: string;
  nowIso: string;
}

/** What is printed on a genuine paper, and whether it still counts. */
export function VerifiedCertificate({ certificate, timeZone, nowIso }: Props) {
  const { content, validity, number, issuedByName, issuedIso, seal } = certificate;
  const { shape, title, words } = validitySaid(validity, content.kind, timeZone);
  const board = content.kind === 'board' ? content.boards[0]! : null;
  return (
    <VerifyFrame
      shape={shape}
      title={title}
      under={`Checked now, ${dayWords(nowIso, timeZone)}, ${clockWords(nowIso, timeZone)}`}
    >
      {words ? <p className="border-b-2 border-ink py-4 text-[19px] font-bold">{words}</p> : null}
      <p className="mt-4 text-[27px]">
        {board ? (
          <SerialStrip serial={board.serial} boardTypeCode={content.boardTypeCode} />
        ) : (
          <>
            Lot <b className="font-num">{content.lotCode}</b>
          </>
        )}
      </p>
      <p className="text-ink-2">
        Certificate <span className="font-num">{number}</span>
      </p>
      <p className="mt-2">{board ? boardSentence(content, timeZone) : lotSentence(content)}</p>
      <p className="mt-1 mb-4">{validity.kind === 'valid' ? 'Compare it with your paper.' : ''}</p>
      {board ? (
        <div className="border-t-2 border-ink pt-3">
          <VerifiedRails board={{ values: board.values }} />
          <VerifiedValues values={board.values} />
        </div>
      ) : (
        <VerifiedBoards
          boards={content.boards.map(({ serial, values, concession }) => ({
            serial,
            values,
            conceded: concession !== null,
          }))}
        />
      )}
      <p className="mt-4 border-t-2 border-ink pt-3 text-ink-2">
        Issued by <b className="text-ink">{issuedByName}</b>, quality, {dayWords(issuedIso, timeZone)}.
        {validity.kind === 'valid' ? ' Not revoked.' : ''} Seal{' '}
        <span className="font-num whitespace-nowrap">…{seal}</span>. {board ? uncertaintyWords(board.values) : ''}
      </p>
      <p className="mt-3 text-ink-2">{cautionSentences.join(' ')}</p>
      <details className="mt-5">
        <summary className="flex min-h-[46px] cursor-pointer items-center justify-center border-2 border-accent bg-sheet px-4 py-2 font-bold text-accent hover:bg-accent-wash">
          Paper says something else
        </summary>
        <Advice
          steps={['Trust this page, not the paper: it shows what the maker issued under this code.', callTheMaker]}
        />
      </details>
      <p className="mt-6 text-cap text-ink-3">
        This page shows only what is printed on the certificate. It keeps no record of who looked.
      </p>
    </VerifyFrame>
  );
}

function uncertaintyWords(values: Props['certificate']['content']['boards'][number]['values']): string {
  const trip = values.find(({ quantity }) => quantity === 'trip-volts');
  const { expanded, k } = trip ? valueText(trip) : { expanded: '', k: '' };
  return expanded ? `The uncertainty of the trip point is ${expanded} V, k = ${k}.` : '';
}
