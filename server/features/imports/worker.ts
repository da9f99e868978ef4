import { parentPort } from 'node:worker_threads';
import { type Job, work } from './work.ts';

/** Does one job after another as they are sent; says how far it is, and how each ended. */
parentPort?.on('message', (job: Job) => {
  let told = 0;
  const done = work(job, (share) => {
    if (share - told < 0.02) return;
    told = share;
    parentPort?.postMessage({ share });
  });
  parentPort?.postMessage({ done });
});
