// Finds a Chromium for the tests, and fetches one if there is none. Run by itself it prints the path.
import { execFileSync, spawnSync } from 'node:child_process';
import { accessSync, constants, existsSync, mkdirSync } from 'node:fs';
import { createRequire } from 'node:module';
import { homedir } from 'node:os';
import { delimiter, join } from 'node:path';
import { pathToFileURL } from 'node:url';

const names = ['chromium', 'chromium-browser', 'google-chrome'];
// The newest release that runs on Node 20. Not a dependency of the project: few machines need it.
const packaged = '@sparticuz/chromium@147.0.0';

/** Path of a browser that starts; throws with what to do when there is none to be had. */
export async function findChromium() {
  if (process.env.CHROMIUM) {
    if (starts(process.env.CHROMIUM)) return process.env.CHROMIUM;
    throw new Error(`CHROMIUM is set to ${process.env.CHROMIUM}, which does not start.`);
  }
  const found = onPath() ?? fromSystemPackages() ?? (await fromNpm());
  if (found) return found;
  throw new Error(
    'No browser for the end-to-end tests. Install Chromium (Debian: apt-get install chromium), ' +
      'or set CHROMIUM to the path of a Chrome or Chromium.',
  );
}

function onPath() {
  const folders = (process.env.PATH ?? '').split(delimiter);
  const candidates = names.flatMap((name) => folders.map((folder) => join(folder, name)));
  return candidates.find((path) => isExecutable(path) && starts(path));
}

function fromSystemPackages() {
  if (process.getuid?.() !== 0 || spawnSync('apt-get', ['--version']).status !== 0) return undefined;
  process.stderr.write('No browser found: installing Chromium …\n');
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  const packages = ['chromium', 'fonts-liberation'];
  for (const args of [['update'], ['install', '-y', '--no-install-recommends', ...packages]]) {
    const { status } = spawnSync('apt-get', ['-qq', ...args], { env, stdio: ['ignore', 'ignore', 'inherit'] });
    if (status !== 0) return undefined;
  }
  return onPath();
}

async function fromNpm() {
  const folder = join(process.env.XDG_CACHE_HOME || join(homedir(), '.cache'), 'panelgap-chromium');
  const home = join(folder, 'node_modules/@sparticuz/chromium');
  try {
    if (!existsSync(home)) {
      process.stderr.write('No browser found: taking the one that comes in an npm package …\n');
      mkdirSync(folder, { recursive: true });
      execFileSync('npm', ['install', '--prefix', folder, '--no-save', '--ignore-scripts', packaged], {
        stdio: ['ignore', 'ignore', 'inherit'],
      });
    }
    const entry = createRequire(join(folder, 'package.json')).resolve('@sparticuz/chromium');
    const { default: chromium } = await import(pathToFileURL(entry).href);
    const path = await chromium.executablePath();
    return starts(path) ? path : undefined;
  } catch (error) {
    process.stderr.write(`The npm package did not help: ${error.message}\n`);
    return undefined;
  }
}

function isExecutable(path) {
  try {
    accessSync(path, constants.X_OK);
    return true;
  } catch {
    return false;
  }
}

/** A wrapper script or a binary without its libraries lies on the path just the same, so ask it. */
function starts(path) {
  return spawnSync(path, ['--version'], { timeout: 20_000, stdio: 'ignore' }).status === 0;
}

if (process.argv[1] && import.meta.url === pathToFileURL(process.argv[1]).href) {
  process.stdout.write(`${await findChromium()}\n`);
}
