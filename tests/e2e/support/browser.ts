import { execFileSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';

const finder = fileURLToPath(new URL('../../chromium.mjs', import.meta.url));
const FLAGS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
  '--no-first-run',
];

/** How to launch the browser: the one in CHROMIUM, else the one that the finder comes up with. */
export function browser(): { executablePath: string; args: string[] } {
  const executablePath =
    process.env['CHROMIUM'] ?? execFileSync(process.execPath, [finder], { encoding: 'utf8' }).trim();
  return { executablePath, args: FLAGS };
}
