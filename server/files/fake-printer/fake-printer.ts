import { existsSync, mkdirSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import http from 'node:http';
import type { AddressInfo } from 'node:net';
import path from 'node:path';
import {
  decodeIpp,
  encodeIpp,
  findAttribute,
  groupTags,
  ippOperations,
  valueTags,
  type IppAttribute,
  type IppMessage,
} from '../printing/ipp-message';

/**
 * A label printer for demo and tests: speaks IPP on loopback and keeps every document as a file. It is out of paper while
 * the file `out-of-paper` lies in its folder; jobs that it took wait until the file is gone.
 */
export interface FakePrinter {
  /** To be entered as the printer's address. */
  uri: string;
  setPaper(loaded: boolean): void;
  close(): Promise<void>;
}

interface Job {
  id: number;
  name: string;
  pdf: Buffer;
  /** RFC 8011, section 5.3.7. */
  state: 'processing-stopped' | 'canceled' | 'completed';
}
const jobStates = { 'processing-stopped': 6, canceled: 7, completed: 9 };
const statuses = {
  ok: 0x0000,
  badRequest: 0x0400,
  notFound: 0x0406,
  formatNotSupported: 0x040a,
  unknownOperation: 0x0501,
};

const text = (name: string, tag: number, ...values: (string | number)[]): IppAttribute => ({ name, tag, values });

export async function startFakePrinter(options: { folder: string; port: number }): Promise<FakePrinter> {
  mkdirSync(options.folder, { recursive: true });
  const paperFlag = path.join(options.folder, 'out-of-paper');
  const jobs = new Map<number, Job>();
  let lastJobId = readdirSync(options.folder).filter((file) => file.endsWith('.pdf')).length;
  let uri = '';

  const hasPaper = () => !existsSync(paperFlag);
  const printWaiting = () => {
    if (!hasPaper()) return;
    for (const job of jobs.values()) {
      if (job.state !== 'processing-stopped') continue;
      const safeName = job.name.replace(/[^\w.-]+/g, '_');
      writeFileSync(path.join(options.folder, `${String(job.id).padStart(5, '0')}-${safeName}.pdf`), job.pdf);
      job.state = 'completed';
    }
  };

  const printerAttributes = (): IppAttribute[] => [
    text('printer-state', valueTags.enum, hasPaper() ? 3 : 5),
    text('printer-state-reasons', valueTags.keyword, hasPaper() ? 'none' : 'media-empty-error'),
    text('document-format-supported', valueTags.mimeType, 'application/pdf'),
  ];
  const jobAttributes = (job: Job): IppAttribute[] => [
    text('job-id', valueTags.integer, job.id),
    text('job-uri', valueTags.uri, `${uri}/${job.id}`),
    text('job-state', valueTags.enum, jobStates[job.state]),
    text('job-state-reasons', valueTags.keyword, job.state === 'completed' ? 'job-completed-successfully' : 'none'),
  ];

  function answer(request: IppMessage): { status: number; group?: { tag: number; attributes: IppAttribute[] } } {
    const operation = request.groups.find((group) => group.tag === groupTags.operation)?.attributes ?? [];
    // These two come first, in this order (RFC 8011, section 4.1.4).
    if (operation[0]?.name !== 'attributes-charset' || operation[1]?.name !== 'attributes-natural-language')
      return { status: statuses.badRequest };
    const of = (name: string) => findAttribute(request, groupTags.operation, name)?.values[0];
    if (typeof of('printer-uri') !== 'string') return { status: statuses.badRequest };

    switch (request.code) {
      case ippOperations.getPrinterAttributes:
        return { status: statuses.ok, group: { tag: groupTags.printer, attributes: printerAttributes() } };
      case ippOperations.printJob: {
        if (of('document-format') !== 'application/pdf' || request.data.subarray(0, 5).toString() !== '%PDF-')
          return { status: statuses.formatNotSupported };
        const name = String(of('job-name') ?? 'untitled');
        const job: Job = { id: ++lastJobId, name, pdf: request.data, state: 'processing-stopped' };
        jobs.set(job.id, job);
        printWaiting();
        return { status: statuses.ok, group: { tag: groupTags.job, attributes: jobAttributes(job) } };
      }
      case ippOperations.getJobAttributes:
      case ippOperations.cancelJob: {
        const job = jobs.get(Number(of('job-id')));
        if (!job) return { status: statuses.notFound };
        if (request.code === ippOperations.cancelJob && job.state !== 'completed') job.state = 'canceled';
        return { status: statuses.ok, group: { tag: groupTags.job, attributes: jobAttributes(job) } };
      }
      default:
        return { status: statuses.unknownOperation };
    }
  }

  const server = http.createServer((incoming, outgoing) => {
    const chunks: Buffer[] = [];
    incoming.on('data', (chunk: Buffer) => chunks.push(chunk));
    incoming.on('end', () => {
      const request = decodeIpp(Buffer.concat(chunks));
      if (incoming.method !== 'POST' || incoming.headers['content-type'] !== 'application/ipp' || !request) {
        outgoing.writeHead(400).end();
        return;
      }
      printWaiting();
      const { status, group } = answer(request);
      const head = [
        text('attributes-charset', valueTags.charset, 'utf-8'),
        text('attributes-natural-language', valueTags.language, 'en'),
        text('status-message', valueTags.text, status === statuses.ok ? 'successful-ok' : 'client-error'),
      ];
      const groups = [{ tag: groupTags.operation as number, attributes: head }, ...(group ? [group] : [])];
      outgoing.writeHead(200, { 'Content-Type': 'application/ipp' });
      outgoing.end(encodeIpp({ code: status, requestId: request.requestId, groups, data: Buffer.alloc(0) }));
    });
  });
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(options.port, '127.0.0.1', resolve);
  });
  uri = `ipp://127.0.0.1:${(server.address() as AddressInfo).port}/ipp/print`;

  return {
    uri,
    setPaper(loaded) {
      if (loaded) rmSync(paperFlag, { force: true });
      else writeFileSync(paperFlag, '');
      printWaiting();
    },
    close: () =>
      new Promise((resolve) => {
        server.close(() => resolve());
        server.closeAllConnections();
      }),
  };
}
