import { parentPort } from 'node:worker_threads';

/** Answers each job of `runJobs` in a worker thread. */
export function serveJobs<Job, Answer>(perform: (job: Job) => Promise<Answer>): void {
  const port = parentPort;
  if (!port) throw new Error('serveJobs runs in a worker thread only.');
  port.on('message', (job: Job) => {
    // A rejection must end the figure, not vanish.
    perform(job).then(
      (answer) => port.postMessage(answer),
      (error: unknown) => {
        throw error;
      },
    );
  });
}
