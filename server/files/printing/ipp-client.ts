import http from 'node:http';
import https from 'node:https';
import {
  decodeIpp,
  encodeIpp,
  findAttribute,
  groupTags,
  ippOperations,
  valueTags,
  type IppAttribute,
  type IppMessage,
} from './ipp-message';

/** `code` is one of these; the sentence says what a person can do. */
export const printProblems = [
  'printer-unreachable',
  'printer-out-of-paper',
  'printer-needs-attention',
  'printer-refused',
  'printer-gave-up',
  /** Taken, then unknown: printed or not, nobody can tell from here. */
  'label-lost',
] as const;
export type PrintProblem = (typeof printProblems)[number];

export interface PrintRefusal {
  ok: false;
  code: PrintProblem;
  sentence: string;
}

export type Printed<T> = ({ ok: true } & T) | PrintRefusal;

const refusal = (code: PrintProblem, sentence: string): PrintRefusal => ({ ok: false, code, sentence });

/** Where an ipp address is reached: port 631, path as given (RFC 8010, section 4.2 and RFC 3510). */
export function httpUrlOf(printerUri: string): URL | null {
  const match = /^(ipps?|https?):\/\/(.+)$/i.exec(printerUri);
  if (!match) return null;
  const scheme = match[1]!.toLowerCase();
  if (!URL.canParse(`http://${match[2]}`)) return null;
  const url = new URL(`${scheme.endsWith('s') ? 'https' : 'http'}://${match[2]}`);
  // URL drops a port that is its scheme's own, so an explicit :80 is looked for in the text.
  const hasPort = /^(\[[^\]]*\]|[^/:]*):\d+/.test(match[2]!);
  if (scheme.startsWith('ipp') && !hasPort) url.port = '631';
  return url;
}

/** client-error-not-found (RFC 8011, appendix B). */
const notFound = 0x0406;

let lastRequestId = 0;

function request(printerUri: string, operation: number, extra: IppAttribute[], data: Buffer = Buffer.alloc(0)): Buffer {
  const head: IppAttribute[] = [
    { name: 'attributes-charset', tag: valueTags.charset, values: ['utf-8'] },
    { name: 'attributes-natural-language', tag: valueTags.language, values: ['en'] },
    { name: 'printer-uri', tag: valueTags.uri, values: [printerUri] },
  ];
  lastRequestId = (lastRequestId % 0x7fffffff) + 1;
  const groups = [{ tag: groupTags.operation, attributes: [...head, ...extra] }];
  return encodeIpp({ code: operation, requestId: lastRequestId, groups, data });
}

async function post(printerUri: string, body: Buffer, timeoutMs: number): Promise<Printed<{ message: IppMessage }>> {
  const url = httpUrlOf(printerUri);
  if (!url)
    return refusal(
      'printer-refused',
      `${printerUri} is not a printer address. Use one such as ipp://printer/ipp/print.`,
    );
  const unreachable = refusal(
    'printer-unreachable',
    'Label printer does not answer. Check that it is switched on and connected.',
  );
  const answer = await new Promise<{ status: number; body: Buffer } | null>((resolve) => {
    const sent = (url.protocol === 'https:' ? https : http).request(
      url,
      {
        method: 'POST',
        headers: { 'Content-Type': 'application/ipp', 'Content-Length': body.length },
        signal: AbortSignal.timeout(timeoutMs),
      },
      (response) => {
        const chunks: Buffer[] = [];
        response.on('data', (chunk: Buffer) => chunks.push(chunk));
        response.on('end', () => resolve({ status: response.statusCode ?? 0, body: Buffer.concat(chunks) }));
        response.on('error', () => resolve(null));
      },
    );
    sent.on('error', () => resolve(null));
    sent.end(body);
  });
  if (!answer) return unreachable;
  const message = answer.status === 200 ? decodeIpp(answer.body) : null;
  if (!message)
    return refusal('printer-refused', `Label printer answered with HTTP status ${answer.status}. Check its address.`);
  // Statuses below 0x0100 are successful (RFC 8011, appendix B).
  if (message.code >= 0x0100) {
    const text = findAttribute(message, groupTags.operation, 'status-message')?.values[0];
    const status = `0x${message.code.toString(16).padStart(4, '0')}`;
    if (message.code === notFound)
      return refusal(
        'label-lost',
        'Label printer no longer knows this label. See whether it was printed before you print it again.',
      );
    return refusal('printer-refused', `Label printer refused the label: ${text ?? 'no reason given'} (${status}).`);
  }
  return { ok: true, message };
}

const keywords = (message: IppMessage, group: number, name: string) =>
  (findAttribute(message, group, name)?.values ?? []).map(String);

/** What stops a printer, from its state reasons (RFC 8011, section 5.4.12); null when nothing does. */
function stoppedBy(reasons: string[]): PrintRefusal | null {
  if (reasons.some((reason) => /^media-(empty|needed)(-error)?$/.test(reason)))
    return refusal('printer-out-of-paper', 'Label printer is out of paper. Testing goes on.');
  const reason = reasons.find((r) => r !== 'none' && !r.endsWith('-warning') && !r.endsWith('-report'));
  return refusal(
    'printer-needs-attention',
    `Label printer has stopped: ${(reason ?? 'reason unknown').replaceAll('-', ' ')}. See its panel.`,
  );
}

/** Whether the printer would print now. */
export async function askPrinter(printerUri: string, timeoutMs: number): Promise<Printed<object>> {
  const wanted: IppAttribute = {
    name: 'requested-attributes',
    tag: valueTags.keyword,
    values: ['printer-state', 'printer-state-reasons'],
  };
  const answer = await post(printerUri, request(printerUri, ippOperations.getPrinterAttributes, [wanted]), timeoutMs);
  if (!answer.ok) return answer;
  const stopped = 5;
  if (findAttribute(answer.message, groupTags.printer, 'printer-state')?.values[0] !== stopped) return { ok: true };
  return stoppedBy(keywords(answer.message, groupTags.printer, 'printer-state-reasons')) ?? { ok: true };
}

/** Print-Job with a PDF. The printer's job number tells later what became of it. */
export async function sendDocument(
  printerUri: string,
  document: { jobName: string; pdf: Buffer },
  timeoutMs: number,
): Promise<Printed<{ jobId: number }>> {
  const body = request(
    printerUri,
    ippOperations.printJob,
    [
      { name: 'requesting-user-name', tag: valueTags.name, values: ['sillwright'] },
      { name: 'job-name', tag: valueTags.name, values: [document.jobName] },
      { name: 'document-format', tag: valueTags.mimeType, values: ['application/pdf'] },
    ],
    document.pdf,
  );
  const answer = await post(printerUri, body, timeoutMs);
  if (!answer.ok) return answer;
  const jobId = findAttribute(answer.message, groupTags.job, 'job-id')?.values[0];
  if (typeof jobId !== 'number')
    return refusal('printer-refused', 'Label printer took the label without a job number.');
  return { ok: true, jobId };
}

/** `done` once printed, `working` while it waits or prints; a stopped, aborted or cancelled job is a refusal. */
export async function askJob(
  printerUri: string,
  jobId: number,
  timeoutMs: number,
): Promise<Printed<{ state: 'done' | 'working' }>> {
  const job: IppAttribute = { name: 'job-id', tag: valueTags.integer, values: [jobId] };
  const answer = await post(printerUri, request(printerUri, ippOperations.getJobAttributes, [job]), timeoutMs);
  if (!answer.ok) return answer;
  const state = findAttribute(answer.message, groupTags.job, 'job-state')?.values[0];
  const completed = 9;
  if (state === completed) return { ok: true, state: 'done' };
  // 7 cancelled, 8 aborted (RFC 8011, section 5.3.7).
  if (state === 7 || state === 8) return refusal('printer-gave-up', 'Label printer gave the label up. Print it again.');
  const printer = await askPrinter(printerUri, timeoutMs);
  return printer.ok ? { ok: true, state: 'working' } : printer;
}
