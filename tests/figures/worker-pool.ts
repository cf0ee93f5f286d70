import { mkdtempSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { Worker } from 'node:worker_threads';
import { build } from 'esbuild';

/** Two cores are what a figure may count on. */
const workers = 2;
const root = fileURLToPath(new URL('../..', import.meta.url));

/**
 * Runs jobs in worker threads, each thread taking the next job when it is done with one. The worker module answers each
 * message with one message (see `serveJobs`). Jobs and answers are plain data. It is bundled as the product is, so that a figure
 * times what is delivered.
 */
export async function runJobs<Job, Answer>(
  module: URL,
  jobs: readonly Job[],
  onAnswer: (job: Job, answer: Answer) => void,
): Promise<void> {
  const folder = mkdtempSync(join(root, 'node_modules/.figure-'));
  const outfile = join(folder, 'worker.mjs');
  try {
    await build({
      entryPoints: [fileURLToPath(module)],
      outfile,
      bundle: true,
      platform: 'node',
      target: 'node20',
      format: 'esm',
      packages: 'external',
      logLevel: 'error',
    });
    await answerAll(outfile, jobs, onAnswer);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

async function answerAll<Job, Answer>(
  entry: string,
  jobs: readonly Job[],
  onAnswer: (job: Job, answer: Answer) => void,
): Promise<void> {
  let next = 0;
  const work = () =>
    new Promise<void>((resolve, reject) => {
      const worker = new Worker(entry);
      let job: Job;
      const give = () => {
        if (next >= jobs.length) return void worker.terminate().then(() => resolve());
        job = jobs[next++]!;
        worker.postMessage(job);
      };
      worker.on('message', (answer: Answer) => {
        onAnswer(job, answer);
        give();
      });
      worker.on('error', reject);
      give();
    });
  await Promise.all(Array.from({ length: workers }, work));
}
