/** Standard codes this station's instruments and simulator use; texts of SCPI-1999 volume 2, 21.8. */
export const scpiErrorTexts = {
  0: 'No error',
  [-100]: 'Command error',
  [-101]: 'Invalid character',
  [-102]: 'Syntax error',
  [-103]: 'Invalid separator',
  [-104]: 'Data type error',
  [-108]: 'Parameter not allowed',
  [-109]: 'Missing parameter',
  [-113]: 'Undefined header',
  [-200]: 'Execution error',
  [-221]: 'Settings conflict',
  [-222]: 'Data out of range',
  [-224]: 'Illegal parameter value',
  [-300]: 'Device-specific error',
  [-350]: 'Queue overflow',
  [-400]: 'Query error',
  [-410]: 'Query INTERRUPTED',
  [-420]: 'Query UNTERMINATED',
  [-430]: 'Query DEADLOCKED',
  [-440]: 'Query UNTERMINATED after indefinite response',
} as const;
export type ScpiErrorCode = keyof typeof scpiErrorTexts;

export interface QueuedError {
  code: number;
  message: string;
}

export type ScpiErrorClass = 'none' | 'command' | 'execution' | 'device' | 'query' | 'unknown';

/** Classes by range, as the event status register reports them (IEEE 488.2 11.5.1). */
export function scpiErrorClass(code: number): ScpiErrorClass {
  if (code === 0) return 'none';
  if (code > 0 || (code <= -300 && code > -400)) return 'device';
  if (code <= -100 && code > -200) return 'command';
  if (code <= -200 && code > -300) return 'execution';
  if (code <= -400 && code > -500) return 'query';
  return 'unknown';
}

const answer = /^\s*([+-]?\d+)\s*(?:,\s*"((?:[^"]|"")*)"\s*)?$/;

/** Reads an answer to `SYSTem:ERRor?`, such as `-113,"Undefined header"`; null when it is none. */
export function parseQueuedError(text: string): QueuedError | null {
  const match = answer.exec(text);
  if (!match) return null;
  return { code: Number(match[1]) + 0, message: (match[2] ?? '').replaceAll('""', '"') };
}

export function formatQueuedError(error: QueuedError): string {
  return `${error.code},"${error.message.replaceAll('"', '""')}"`;
}
