import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { openDatabase } from '../../server/platform/database.ts';
import { readPortfolio } from '../support/portfolio.ts';
import { answersDocument } from './answers-document.ts';
import { loadPortfolio } from './load-portfolio.ts';

/** `npm run answers:check -- PORTFOLIO.json`: the portfolio through an empty warehouse, its answers on standard output. */
async function check(file: string | undefined): Promise<void> {
  if (!file) throw new Error('Give the portfolio: npm run answers:check -- PORTFOLIO.json');
  // npm runs scripts in the package's folder and says where it was called.
  const place = path.resolve(process.env['INIT_CWD'] ?? process.cwd(), file);
  const portfolio = readPortfolio(JSON.parse(readFileSync(place, 'utf8')));
  const dataDir = mkdtempSync(path.join(tmpdir(), 'panelgap-check-'));
  try {
    const database = await openDatabase(dataDir);
    try {
      const answers = answersDocument(await loadPortfolio(database, portfolio), portfolio);
      process.stdout.write(`${JSON.stringify(answers, null, 2)}\n`);
    } finally {
      await database.close();
    }
  } finally {
    rmSync(dataDir, { recursive: true, force: true });
  }
}

check(process.argv[2]).catch((error: unknown) => {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exitCode = 1;
});
