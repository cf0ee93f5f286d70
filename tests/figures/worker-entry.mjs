import { workerData } from 'node:worker_threads';
import { register } from 'tsx/esm/api';

// A worker thread does not inherit tsx from the command line, so it is registered here before any TypeScript.
register();
await import(workerData.module);
