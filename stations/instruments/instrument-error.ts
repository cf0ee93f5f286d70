import type { NoVerdictReason } from '@/lib/run/types';
import type { QueuedError } from '@/lib/scpi/queued-error';

export const instrumentNames = ['supply', 'meter', 'controller'] as const;
export type InstrumentName = (typeof instrumentNames)[number];

export const instrumentErrorCodes = [
  /** No answer within the deadline. */
  'instrument-timeout',
  /** An answer that is no answer: broken bytes, or not the form that was asked for. */
  'instrument-garbled',
  /** The serial port vanished or could not be opened. */
  'link-lost',
  /** The port was closed by us. */
  'link-closed',
  /** The instrument reported errors in its queue. */
  'instrument-error',
  /** A reading that is no finite number: overload, or nothing measured. */
  'reading-invalid',
] as const;
export type InstrumentErrorCode = (typeof instrumentErrorCodes)[number];

/** What can go wrong with an instrument. Recognised by `code`; the message is a sentence a person can act on. */
export class InstrumentError extends Error {
  override readonly name = 'InstrumentError';

  constructor(
    readonly code: InstrumentErrorCode,
    readonly instrument: InstrumentName,
    message: string,
    readonly queued: QueuedError[] = [],
  ) {
    super(message);
  }
}

export function isInstrumentError(error: unknown): error is InstrumentError {
  return (
    error instanceof Error &&
    'code' in error &&
    'instrument' in error &&
    instrumentErrorCodes.some((code) => code === error.code)
  );
}

const faultOf: Record<InstrumentName, NoVerdictReason> = {
  supply: 'supply-fault',
  meter: 'meter-fault',
  controller: 'fixture-fault',
};

/** Why a run without a verdict ended, by the instrument and what happened to it. Never the board's. */
export function noVerdictReasonOf(error: InstrumentError): NoVerdictReason {
  return error.code === 'link-lost' || error.code === 'link-closed' ? 'link-lost' : faultOf[error.instrument];
}
