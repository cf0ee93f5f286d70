import { layoutLabel } from '@/lib/barcode/label-layout';
import { serialGroups } from '@/lib/barcode/serial-groups';
import type { LabelChange, LabelJob } from '@/db/queries/labels';
import { askJob, askPrinter, sendDocument } from '@/server/files/printing/ipp-client';
import { labelPdf } from '@/server/files/printing/label-pdf';

/** A label that fails so often waits for a person: about three hours of an empty or silent printer. */
export const mostTries = 200;

const answerWithinMs = 5_000;
const askAgainMs = 500;
const longestWaitMs = 60_000;

/** 1, 2, 4 … 60 s. */
export function retryWaitMs(tries: number): number {
  return Math.min(1_000 * 2 ** Math.min(tries, 10), longestWaitMs);
}

/** One try to print, or a look at what became of the job. Returns what to write into the label's row. */
export async function sendLabel(job: LabelJob, now: () => Date): Promise<LabelChange> {
  const later = (ms: number) => new Date(now().getTime() + ms);
  const failed = (problem: string, change: LabelChange = {}): LabelChange => ({
    state: 'failed',
    problem,
    tries: job.tries + 1,
    nextTryAt: later(retryWaitMs(job.tries)),
    ...change,
  });

  let { printerJobId } = job;
  if (printerJobId === null) {
    const drawn = layoutLabel({ ...job, serialGroups: serialGroups(job.serial, job.boardTypeCode) });
    if (!drawn.ok) return failed(drawn.sentence, { tries: mostTries });
    // Asked first: a printer without paper would take the label and print it at some later time, unseen.
    const ready = await askPrinter(job.printerUri, answerWithinMs);
    if (!ready.ok) return failed(ready.sentence);
    const pdf = await labelPdf(drawn.layout, `Label ${job.serial}`);
    const sent = await sendDocument(job.printerUri, { jobName: `Label ${job.serial}`, pdf }, answerWithinMs);
    if (!sent.ok) return failed(sent.sentence);
    printerJobId = sent.jobId;
  }

  const seen = await askJob(job.printerUri, printerJobId, answerWithinMs);
  if (!seen.ok) {
    if (seen.code === 'printer-gave-up') return failed(seen.sentence, { printerJobId: null });
    // Sending it once more could put two labels of one serial number into the world; a person looks first.
    if (seen.code === 'label-lost') return failed(seen.sentence, { printerJobId: null, tries: mostTries });
    return failed(seen.sentence, { printerJobId });
  }
  if (seen.state === 'working') return { state: 'waiting', problem: null, printerJobId, nextTryAt: later(askAgainMs) };
  return { state: 'printed', problem: null, printerJobId, nextTryAt: null, printedAt: now() };
}
