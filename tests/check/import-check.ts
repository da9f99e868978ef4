import { existsSync, mkdirSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { z } from 'zod';
import type { Choice } from '#shared/contracts/import-reading.ts';
import type { Import } from '#shared/contracts/imports.ts';
import { importResult } from './import-result.ts';
import { type OwnServer, ownServer, ServerSaidNo } from './own-server.ts';

const answersSchema = z.array(
  z.object({ kind: z.string(), column: z.string().nullish(), answer: z.union([z.string(), z.number(), z.boolean()]) }),
);
type Answers = z.infer<typeof answersSchema>;
/** Currencies that a file may be in when the shop's own is refused, with where people write them. */
const LOCALES: Readonly<Record<string, string>> = {
  EUR: 'de-DE',
  GBP: 'en-GB',
  CHF: 'de-CH',
  CAD: 'en-CA',
  AUD: 'en-AU',
};
const NOT_FILES = /\.(?:truth|choices|result)\.json$|\.(?:md|py)$/;

/** `npm run import:check -- DIR OUT`: every file of DIR into an empty warehouse of its own, what came of it to OUT. */
async function check(from: string | undefined, to: string | undefined): Promise<void> {
  if (!from || !to) throw new Error('Give two folders: npm run import:check -- DIR OUT');
  const here = process.env['INIT_CWD'] ?? process.cwd();
  const [dir, out] = [path.resolve(here, from), path.resolve(here, to)];
  mkdirSync(out, { recursive: true });
  const files = readdirSync(dir, { withFileTypes: true }).filter((file) => file.isFile() && !NOT_FILES.test(file.name));
  for (const { name } of files.sort((a, b) => a.name.localeCompare(b.name))) {
    const started = Date.now();
    const result = await bringIn(path.join(dir, name), name, 'USD', 'en-US');
    writeFileSync(path.join(out, `${name}.result.json`), `${JSON.stringify(result, null, 1)}\n`);
    process.stdout.write(`${name}: ${result.status}, ${Date.now() - started} ms\n`);
  }
}

type Result = Awaited<ReturnType<typeof importResult>> | ReturnType<typeof refused>;

async function bringIn(file: string, name: string, currency: string, locale: string): Promise<Result> {
  const server = await ownServer(currency, locale);
  try {
    const read = await settled(server, (await server.upload(readFileSync(file), name)).id);
    if (read.reading?.refusal?.kind === 'currency') {
      const other = /in ([A-Z]{3}), and/.exec(read.refusal ?? '')?.[1] ?? '';
      const place = LOCALES[other];
      if (place && other !== currency) return await bringIn(file, name, other, place);
    }
    if (read.state !== 'ready' || !read.reading) return refused(name, read);
    const asked = read.reading.choices;
    const answered = await answer(server, read, answersFor(file));
    await server.post(`/api/imports/${answered.id}/commit`);
    return await importResult(server, name, await settled(server, answered.id), asked);
  } catch (error) {
    if (!(error instanceof ServerSaidNo)) throw error;
    return { file: name, status: 'error', error: { class: `refused-${error.status}`, message: error.message } };
  } finally {
    await server.close();
  }
}

function refused(name: string, read: Import | null) {
  const { kind, row } = read?.reading?.refusal ?? { kind: 'unreadable', row: null };
  return {
    file: name,
    status: 'error',
    error: { class: String(kind), message: read?.refusal ?? 'It could not be read.', ...(row ? { row } : {}) },
  };
}

/** Waits until nothing is being done with an import. */
async function settled(server: OwnServer, id: string): Promise<Import> {
  for (;;) {
    const read: Import = await server.get(`/api/imports/${id}`);
    if (read.state !== 'reading' && read.state !== 'committing') return read;
    await new Promise((resolve) => setTimeout(resolve, 20));
  }
}

function answersFor(file: string): Answers {
  const place = `${file}.choices.json`;
  return existsSync(place) ? answersSchema.parse(JSON.parse(readFileSync(place, 'utf8'))) : [];
}

/** Answers what is open, by the answers given or else as the page would; an answer may raise further questions. */
async function answer(server: OwnServer, read: Import, given: Answers): Promise<Import> {
  let current = read;
  for (let rounds = 0; rounds < 5; rounds++) {
    const answers = Object.fromEntries(
      (current.reading?.choices ?? [])
        .filter((choice) => choice.answer === null)
        .flatMap((choice): [string, string][] => {
          const value = givenAnswer(choice, given) ?? (choice.mustAsk ? choice.preset : null);
          return value === null ? [] : [[choice.id, value]];
        }),
    );
    if (Object.keys(answers).length === 0) return current;
    await server.patch(`/api/imports/${current.id}`, current.version, { answers });
    current = await settled(server, current.id);
  }
  return current;
}

/** The option that a given answer means: by its value, or by words in its label. */
function givenAnswer(choice: Choice, given: Answers): string | null {
  const found = given.find(({ kind, column }) => kind === choice.kind && (column == null || column === choice.column));
  if (!found) return null;
  const wanted = String(found.answer).toLowerCase();
  const option =
    choice.options.find(({ value }) => value.toLowerCase() === wanted) ??
    choice.options.find(({ label }) => label.toLowerCase().includes(wanted));
  return option?.value ?? null;
}

check(process.argv[2], process.argv[3]).catch((error: unknown) => {
  process.stderr.write(`${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`);
  process.exitCode = 1;
});
