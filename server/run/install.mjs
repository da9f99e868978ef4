// Makes sure that the packages of the lock file are in node_modules, with an SQLite that loads in this Node.
import { createHash } from 'node:crypto';
import { copyFileSync, existsSync, mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { homedir } from 'node:os';
import { dirname, join } from 'node:path';
import { run, runs } from './child.mjs';
import { root, say, stop } from './place.mjs';

const modules = join(root, 'node_modules');
const lockStamp = join(modules, '.installed-from');
const sqlite = join(modules, 'better-sqlite3');
const binary = join(sqlite, 'build/Release/better_sqlite3.node');
const binaryStamp = join(sqlite, 'build/.made-for');

/** Installs what is missing; quick and silent when nothing is. */
export async function install() {
  checkNode();
  const lock = createHash('sha256')
    .update(readFileSync(join(root, 'package-lock.json')))
    .digest('hex');
  if (read(lockStamp) !== lock) {
    say('Installing packages (half a minute or so) …');
    // Scripts stay off: the only one we need is SQLite's, and it runs below. Dev packages build the client.
    await must('npm', ['ci', '--ignore-scripts', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error']);
    writeFileSync(lockStamp, lock);
  }
  await installSqlite();
}

function checkNode() {
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major < 20 || (major === 20 && minor < 20)) {
    stop(`Panelgap needs Node 20.20 or newer; this is ${process.version}. Install it from your system or with nvm.`);
  }
}

/** SQLite is compiled once per user and Node, then copied from the user's cache. */
async function installSqlite() {
  const { version } = JSON.parse(readFileSync(join(sqlite, 'package.json'), 'utf8'));
  const madeFor = `${version}-abi${process.versions.modules}-${process.platform}-${process.arch}`;
  if (existsSync(binary) && read(binaryStamp) === madeFor) return;

  const cached = join(cacheFolder(), `${madeFor}-${libcVersion()}.node`);
  if (existsSync(cached)) {
    mkdirSync(dirname(binary), { recursive: true });
    copyFileSync(cached, binary);
  }
  if (!(await loads())) {
    say('Preparing SQLite for this machine (up to two minutes, only once) …');
    await must('npm', ['rebuild', 'better-sqlite3', '--loglevel=error'], { JOBS: '2' }, sqliteAdvice);
    if (!(await loads())) stop(`SQLite was built but does not load. ${sqliteAdvice}`);
    store(cached);
  }
  writeFileSync(binaryStamp, madeFor);
}

const sqliteAdvice = 'It needs a C++ compiler, make and Python 3 (on Debian: apt-get install g++ make python3).';

/** Tried in a process of its own: a binary made for another system can take the process down with it. */
function loads() {
  if (!existsSync(binary)) return false;
  const trial = "new (require('better-sqlite3'))(':memory:').exec('select 1')";
  return runs(process.execPath, ['-e', trial]);
}

/** Best effort: without a cache the next clone compiles again, nothing worse. */
function store(cached) {
  try {
    mkdirSync(dirname(cached), { recursive: true });
    const partial = `${cached}.${process.pid}`;
    copyFileSync(binary, partial);
    renameSync(partial, cached);
  } catch (error) {
    say(`(SQLite was not kept for the next clone: ${error.message})`);
  }
}

function cacheFolder() {
  return join(process.env.XDG_CACHE_HOME || join(homedir(), '.cache'), 'panelgap-native');
}

function libcVersion() {
  process.report.excludeNetwork = true; // else the report looks up host names
  return `glibc${process.report.getReport().header.glibcVersionRuntime ?? 'none'}`;
}

function read(file) {
  return existsSync(file) ? readFileSync(file, 'utf8') : null;
}

async function must(command, args, env = {}, advice = '') {
  const code = await run(command, args, env);
  if (code !== 0) stop(`"${command} ${args.slice(0, 2).join(' ')}" failed. ${advice}`);
}
