import { Worker } from 'node:worker_threads';
import type { Done, Job } from './work.ts';

const ENTRY = new URL('./worker.ts', import.meta.url).href;
// Node cannot load TypeScript as a worker's entry; a line of JavaScript that registers the loader first can.
const BOOT = `import('tsx/esm/api').then(({ register }) => { register(); return import(${JSON.stringify(ENTRY)}); })`;
const MOST_MEGABYTES = 512;

type Message = { readonly share: number } | { readonly done: Done };

/** Does a job in a thread of its own, so that no request waits for it. `onPart` hears its share done, 0–1. */
export function runJob(job: Job, onPart: (share: number) => void = () => undefined): Promise<Done> {
  return new Promise((resolve, reject) => {
    const worker = new Worker(BOOT, { eval: true, workerData: job, resourceLimits: { maxOldGenerationSizeMb: MOST_MEGABYTES } });
    worker.on('message', (message: Message) => ('done' in message ? resolve(message.done) : onPart(message.share)));
    worker.once('error', reject);
    worker.once('exit', () => reject(new Error('The import worker ended without an answer.')));
  });
}
