import { Worker } from 'node:worker_threads';
import type { Done, Job } from './work.ts';

const ENTRY = new URL('./worker.ts', import.meta.url).href;
// Node cannot load TypeScript as a worker's entry; a line of JavaScript that registers the loader first can.
const BOOT = `import('tsx/esm/api').then(({ register }) => { register(); return import(${JSON.stringify(ENTRY)}); })`;
// A tight young generation keeps what rows leave behind small; the old one is a limit, not a plan.
const MEMORY = { maxOldGenerationSizeMb: 256, maxYoungGenerationSizeMb: 12 };
const KEPT_MS = 30_000;

type Message = { readonly share: number } | { readonly done: Done };

/** A thread that has done its job and waits a while for the next: starting one costs more than reading most files. */
let idle: { readonly worker: Worker; readonly ending: NodeJS.Timeout } | null = null;

/** Does a job in a thread of its own, so that no request waits for it. `onPart` hears its share done, 0–1. */
export async function runJob(job: Job, onPart: (share: number) => void = () => undefined): Promise<Done> {
  const worker = takeIdle() ?? new Worker(BOOT, { eval: true, resourceLimits: MEMORY });
  worker.ref();
  try {
    const done = await ask(worker, job, onPart);
    keepIdle(worker);
    return done;
  } catch (error) {
    await worker.terminate();
    throw error;
  } finally {
    // Only these: a worker loses its own listeners, too, when all are removed.
    for (const event of ['message', 'error', 'exit']) worker.removeAllListeners(event);
  }
}

function ask(worker: Worker, job: Job, onPart: (share: number) => void): Promise<Done> {
  return new Promise((resolve, reject) => {
    worker.on('message', (message: Message) => ('done' in message ? resolve(message.done) : onPart(message.share)));
    worker.once('error', reject);
    worker.once('exit', () => reject(new Error('The import worker ended without an answer.')));
    worker.postMessage(job);
  });
}

function takeIdle(): Worker | null {
  const found = idle?.worker ?? null;
  if (idle) clearTimeout(idle.ending);
  idle = null;
  return found;
}

function keepIdle(worker: Worker): void {
  if (idle) {
    void worker.terminate();
    return;
  }
  worker.unref();
  const ending = setTimeout(() => void takeIdle()?.terminate(), KEPT_MS);
  idle = { worker, ending: ending.unref() };
}
