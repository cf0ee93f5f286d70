import type { CertificateContent, CertifiedBench, CertifiedBoard, CertifiedInstrument } from '../contracts/certificate';
import { rejectWords } from '../messages/reject-words';
import type { DecisionRule } from '../sequence/step';

const ordinals = ['first', 'second', 'third', 'fourth', 'fifth', 'sixth', 'seventh', 'eighth', 'ninth', 'tenth'];
const lower = (words: string) => words.charAt(0).toLowerCase() + words.slice(1);
const ended = (words: string) => words.replace(/\.$/, '');

/** 25 November 2026. Midday of a day without a time keeps it the same day wherever it is read. */
export function dayWords(iso: string, timeZone: string): string {
  const format = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'long', year: 'numeric', timeZone });
  return format.format(new Date(iso));
}
const plainDay = (day: string) => dayWords(`${day}T12:00:00Z`, 'UTC');

/** 11:38 GMT; the zone is named, since a paper does not say where it is read. */
export function clockWords(iso: string, timeZone: string): string {
  const format = new Intl.DateTimeFormat('en-GB', {
    hour: '2-digit',
    minute: '2-digit',
    hour12: false,
    timeZone,
    timeZoneName: 'short',
  });
  return format.format(new Date(iso));
}

export function ruleSentence(rule: DecisionRule): string {
  if (rule.kind === 'simple') return 'A result passes when it lies inside its limits (simple acceptance).';
  return rule.factor === 1
    ? 'A result passes when it lies inside its limits drawn in by a guard band of its U.'
    : `A result passes when it lies inside its limits drawn in by a guard band of ${rule.factor} times its U.`;
}

/** What a certificate says of its board: met or conceded, when, by which sequence, and every attempt before. */
export function boardSentence(content: CertificateContent, timeZone: string): string {
  const board = content.boards[0]!;
  const { sequenceRevision } = content.procedures[board.procedure]!;
  const when = `${dayWords(board.testedAtIso, timeZone)} at ${clockWords(board.testedAtIso, timeZone)}`;
  const by = `sequence ${content.sequenceName} ${sequenceRevision} on ${when}`;
  const verdict = board.concession
    ? `This board did not meet all limits of ${by}. It is used as it is, by concession: ${lower(ended(board.concession.reason))}.`
    : `This board met all limits of ${by}.`;
  return [verdict, attemptWords(board)].filter(Boolean).join(' ');
}

/** "It was the second attempt. Attempt 1 was rejected: release point too high. Then: part R14 was changed." Empty: the first. */
function attemptWords({ attempt, earlier }: CertifiedBoard): string {
  if (attempt === 1) return '';
  const before = earlier.map(({ attempt: n, reason, reworked }) => {
    if (reason === null) return `Attempt ${n} ended without a verdict.`;
    const rework = reworked ? ` Rework: ${lower(ended(reworked))}.` : '';
    return `Attempt ${n} was rejected: ${lower(ended(rejectWords[reason]))}.${rework}`;
  });
  return [`It was the ${ordinals[attempt - 1] ?? `${attempt}th`} attempt.`, ...before].join(' ');
}

export function lotSentence({ boardTypeCode, counts }: CertificateContent): string {
  const { boards, firstPass, laterPass, concessions, apart } = counts!;
  const are = (n: number, one: string, many: string) => `${n} ${n === 1 ? one : many}`;
  return [
    `${are(boards, 'board', 'boards')} of ${boardTypeCode} were made in this lot.`,
    `${firstPass} met all limits the first time${laterPass > 0 ? `, ${laterPass} after another attempt` : ''}.`,
    concessions > 0
      ? `${are(concessions, 'board is used as it is', 'boards are used as they are')}, by concession.`
      : '',
    apart > 0 ? `${are(apart, 'board is', 'boards are')} not covered by this certificate.` : '',
    'Each board covered is listed with its values.',
  ]
    .filter(Boolean)
    .join(' ');
}

const roleWords: Record<CertifiedInstrument['role'], string> = {
  supply: 'Supply',
  multimeter: 'Multimeter',
  'fixture-controller': 'Fixture controller',
};

export function benchWords({ stationCode, fixture }: CertifiedBench): string {
  return `Station ${stationCode}, fixture ${fixture.replace(/^fixture /i, '')}.`;
}

/** "Multimeter DM-S1, no. 101, calibrated 3 March 2026, until 3 March 2027, certificate C-4711." */
export function instrumentWords(instrument: CertifiedInstrument): string {
  const { role, code, serial, calibratedOn, calibratedUntil, certificateNumber } = instrument;
  const which = `${roleWords[role]} ${code}${serial ? `, no. ${serial}` : ''}`;
  if (!calibratedOn || !calibratedUntil)
    return role === 'fixture-controller' ? `${which}.` : `${which}, no calibration on record.`;
  return `${which}, calibrated ${plainDay(calibratedOn)}, until ${plainDay(calibratedUntil)}, certificate ${certificateNumber}.`;
}

export const uncertaintySentence =
  'U is the expanded uncertainty of a result, with its coverage factor k, for a coverage of about 95 %.';

/** Goes on every certificate. */
export const cautionSentences = [
  'This certificate says what was measured. It does not claim that a board is safe.',
  'Site rules, local codes and licensed practice come first.',
];
