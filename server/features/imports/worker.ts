import { parentPort, workerData } from 'node:worker_threads';
import { type Job, work } from './work.ts';

/** What the worker says: how far it is, and how it ended. */
const port = parentPort;
let told = 0;
port?.postMessage({
  done: work(workerData as Job, (share) => {
    if (share - told < 0.02) return;
    told = share;
    port.postMessage({ share });
  }),
});
