import type { Response } from 'express';

const BEAT_MS = 15_000;

/** An answer that goes on until it is done, or until nobody listens any more: each value is sent as one event. */
export class Events<T> {
  readonly from: (closed: AbortSignal) => AsyncIterable<T>;
  constructor(from: (closed: AbortSignal) => AsyncIterable<T>) {
    this.from = from;
  }
}

/** The streams that are open: a server that stops ends them. */
const open = new Set<AbortController>();

/** Sends values as server-sent events, with a comment now and then so that no proxy takes the stream for dead. */
export async function sendEvents<T>(res: Response, events: Events<T>, toJson: (value: T) => string): Promise<void> {
  const closing = new AbortController();
  open.add(closing);
  res.once('close', () => closing.abort());
  res.status(200).set({
    'Content-Type': 'text/event-stream',
    'X-Accel-Buffering': 'no',
    // A stopping server waits for open connections.
    Connection: 'close',
  });
  res.flushHeaders();
  const beat = setInterval(() => res.write(': still here\n\n'), BEAT_MS);
  try {
    for await (const value of events.from(closing.signal)) {
      if (closing.signal.aborted) break;
      res.write(`data: ${toJson(value)}\n\n`);
    }
  } finally {
    clearInterval(beat);
    open.delete(closing);
    res.end();
  }
}

/** Ends every open stream; whoever listened asks again. */
export function endStreams(): void {
  for (const closing of open) closing.abort();
}

/** How many streams are open. */
export const openStreams = () => open.size;
