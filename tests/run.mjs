// npm test: everything, from a fresh clone. `--quick` leaves out the build and the browser.
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { build } from '../server/run/build.mjs';
import { run } from '../server/run/child.mjs';
import { install } from '../server/run/install.mjs';
import { say } from '../server/run/place.mjs';
import { findChromium } from './chromium.mjs';
import { add, closingLine, fromPlaywright, fromVitest, nothing } from './tools/counts.mjs';

const quick = process.argv.includes('--quick');
const reports = mkdtempSync(join(tmpdir(), 'panelgap-tests-'));
let counts = nothing;

const stages = [
  { name: 'packages', run: install },
  { name: 'format (put right with: npm run format)', run: () => tool('@biomejs/biome/bin/biome', 'format', '.') },
  { name: 'lint', run: lint },
  { name: 'types', run: () => tool('typescript/bin/tsc') },
  { name: 'unit, API and page tests', run: vitest },
  { name: 'build', run: build, slow: true },
  { name: 'end to end', run: playwright, slow: true },
];

const started = Date.now();
for (const stage of stages.filter(({ slow }) => !(quick && slow))) {
  const before = Date.now();
  if (!(await passes(stage.run))) {
    say(`\nStopped at: ${stage.name}. What comes after it did not run.`);
    // A stage that is no test, or one that broke before it could count, is one failure.
    if (counts.failed === 0) counts = add(counts, { ...nothing, failed: 1 });
    process.exitCode = 1;
    break;
  }
  say(`— ${stage.name}: ${seconds(before)} s`);
}
rmSync(reports, { recursive: true, force: true });
say(`\n${seconds(started)} s in all`);
say(closingLine(counts));

async function passes(runStage) {
  try {
    const code = await runStage();
    return code === undefined || code === 0;
  } catch (error) {
    say(error.message);
    return false;
  }
}

function tool(path, ...args) {
  return run(process.execPath, [join('node_modules', path), ...args]);
}

function lint() {
  return tool('oxlint/bin/oxlint', '-c', 'tests/tools/oxlint.json', '--type-aware', '--deny-warnings');
}

async function vitest() {
  const report = join(reports, 'vitest.json');
  const code = await tool('vitest/vitest.mjs', 'run', '--reporter=dot', '--reporter=json', `--outputFile=${report}`);
  return counted(code, report, fromVitest);
}

async function playwright() {
  const report = join(reports, 'playwright.json');
  const env = { CHROMIUM: await findChromium(), REPORT_FILE: report };
  const code = await run(
    process.execPath,
    ['node_modules/@playwright/test/cli.js', 'test', '-c', 'tests/e2e/playwright.config.ts'],
    env,
  );
  return counted(code, report, fromPlaywright);
}

function counted(code, report, from) {
  if (existsSync(report)) counts = add(counts, from(JSON.parse(readFileSync(report, 'utf8'))));
  return code;
}

function seconds(since) {
  return ((Date.now() - since) / 1000).toFixed(1);
}
