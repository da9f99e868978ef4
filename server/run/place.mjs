// Where we are, and how the commands speak.
import { fileURLToPath } from 'node:url';

/** Top folder of the project. */
export const root = fileURLToPath(new URL('../..', import.meta.url));

/** One line of progress. */
export function say(text) {
  process.stdout.write(`${text}\n`);
}

/** Ends the command with one line on what is wrong and what to do. */
export function stop(text) {
  process.stderr.write(`\n${text}\n`);
  process.exit(1);
}
