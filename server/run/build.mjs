// Builds the client into dist/ when its sources differ from those that dist/ was built from.
import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { run } from './child.mjs';
import { root, say, stop } from './place.mjs';

const sources = ['src', 'shared', 'index.html', 'vite.config.ts', 'package-lock.json'];
const stamp = join(root, 'dist/.built-from');

/** Builds if needed; quick and silent when nothing changed. */
export async function build() {
  const hash = hashOf(sources);
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === hash) return;
  say('Building the pages …');
  const code = await run(process.execPath, ['node_modules/vite/bin/vite.js', 'build', '--logLevel', 'warn']);
  if (code !== 0) stop('The pages could not be built (see above).');
  writeFileSync(stamp, hash);
}

/** One hash over names and contents of all files below the given paths. */
function hashOf(paths) {
  const hash = createHash('sha256');
  const add = (path) => {
    const full = join(root, path);
    if (!existsSync(full)) return;
    if (statSync(full).isDirectory()) {
      for (const name of readdirSync(full).sort()) add(`${path}/${name}`);
    } else {
      hash.update(`${path}\0`).update(readFileSync(full)).update('\0');
    }
  };
  for (const path of paths) add(path);
  return hash.digest('hex');
}
