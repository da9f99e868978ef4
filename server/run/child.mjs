// Running other programs: to their end, or for as long as we live.
import { spawn } from 'node:child_process';
import { constants } from 'node:os';
import { root } from './place.mjs';

const onWindows = process.platform === 'win32';

/** Runs a program with our output; resolves to its exit code. */
export async function run(command, args, env = {}) {
  const child = launch(command, args, env);
  const forget = passSignals([child]);
  const code = await exitOf(child);
  forget();
  return code;
}

/** Runs a program silently; did it succeed? */
export async function runs(command, args) {
  return (await exitOf(spawn(command, args, { cwd: root, stdio: 'ignore' }))) === 0;
}

/** Starts a program that stays; its keyboard input is closed. */
export function launch(command, args, env = {}) {
  const isShim = onWindows && command === 'npm';
  return spawn(command, args, {
    cwd: root,
    env: { ...process.env, ...env },
    stdio: ['ignore', 'inherit', 'inherit'],
    shell: isShim,
  });
}

/** Exit code of a child; a child ended by a signal counts as 128 + its number, as in a shell. */
export function exitOf(child) {
  return new Promise((resolve) => {
    child.once('error', (error) => {
      process.stderr.write(`${error.message}\n`);
      resolve(127);
    });
    child.once('exit', (code, signal) => resolve(code ?? 128 + (constants.signals[signal] ?? 0)));
  });
}

/** Hands the signals that we get to the children. Returns the function that stops doing so. */
export function passSignals(children) {
  const handlers = ['SIGINT', 'SIGTERM', 'SIGHUP'].map((signal) => {
    const pass = () => {
      // Ctrl-C in a terminal reaches the children by itself; a second one would cut their shutdown short.
      if (signal === 'SIGINT' && process.stdin.isTTY) return;
      for (const child of children) child.kill(signal);
    };
    process.on(signal, pass);
    return () => process.off(signal, pass);
  });
  return () => {
    for (const off of handlers) off();
  };
}
