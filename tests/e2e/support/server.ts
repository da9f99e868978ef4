import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdtempSync, rmSync } from 'node:fs';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { fileURLToPath } from 'node:url';

const top = fileURLToPath(new URL('../../..', import.meta.url));
const START_MS = 60_000;

export interface RunningServer {
  readonly origin: string;
  /** Gone after `stop`. */
  readonly dataDir: string;
  /** Process id, for measurements. */
  readonly pid: number;
  /** All that the server printed so far. */
  output(): string;
  stop(): Promise<void>;
}

/** Starts the built product as `npm start` does, on a free port with books of its own; resolves when it answers. */
export async function startServer(options: { demo: boolean }): Promise<RunningServer> {
  const port = await freePort();
  const dataDir = mkdtempSync(join(tmpdir(), 'panelgap-data-'));
  const { NODE_ENV: _, ...environment } = process.env;
  const memory = ['--max-old-space-size=512', '--max-semi-space-size=4'];
  const child = spawn(process.execPath, [...memory, '--import', 'tsx', 'server/main.ts'], {
    cwd: top,
    env: { ...environment, PORT: String(port), HOST: '127.0.0.1', DATA_DIR: dataDir, DEMO: options.demo ? '1' : '0' },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  const ended = once(child, 'exit');
  let output = '';
  for (const stream of [child.stdout, child.stderr]) stream.on('data', (part: Buffer) => (output += part.toString()));

  const stop = async () => {
    if (child.exitCode === null && child.signalCode === null) child.kill('SIGTERM');
    await ended;
    rmSync(dataDir, { recursive: true, force: true });
  };
  const origin = `http://127.0.0.1:${port}`;
  const deadline = Date.now() + START_MS;
  while (!(await answers(origin))) {
    if (child.exitCode !== null || Date.now() > deadline) {
      await stop();
      throw new Error(`The server did not start:\n${output}`);
    }
    await wait(50);
  }
  return { origin, dataDir, pid: child.pid ?? 0, output: () => output, stop };
}

async function answers(origin: string): Promise<boolean> {
  try {
    return (await fetch(`${origin}/api/health`)).ok;
  } catch {
    return false;
  }
}

async function freePort(): Promise<number> {
  const probe = createServer().listen(0, '127.0.0.1');
  await once(probe, 'listening');
  const address = probe.address();
  probe.close();
  await once(probe, 'close');
  if (address === null || typeof address === 'string') throw new Error('No free port');
  return address.port;
}
