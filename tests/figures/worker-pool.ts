import { Worker } from 'node:worker_threads';

/** Two cores are what a figure may count on. */
const workers = 2;
const entry = new URL('./worker-entry.mjs', import.meta.url);

/**
 * Runs jobs in worker threads, each thread taking the next job when it is done with one. The worker module answers each
 * message with one message (see `serveJobs`). Jobs and answers are plain data.
 */
export async function runJobs<Job, Answer>(
  module: URL,
  jobs: readonly Job[],
  onAnswer: (job: Job, answer: Answer) => void,
): Promise<void> {
  let next = 0;
  const work = () =>
    new Promise<void>((resolve, reject) => {
      const worker = new Worker(entry, { workerData: { module: module.href } });
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
