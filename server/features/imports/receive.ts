import multer from 'multer';
import type { Request, Response } from 'express';
import { open } from 'node:fs/promises';
import { ProblemError } from '../../platform/problems.ts';
import { dropFile, makeImportFolder } from './files.ts';
import { FileRefusal } from './refusal.ts';
import { refuseNotText } from './text/not-text.ts';

export interface ReceivedFile {
  readonly path: string;
  readonly name: string;
  readonly size: number;
}

const MOST_FILES = 20;

/**
 * Takes the uploaded files (field "file") to disk; the limit is on all of them together. They come sorted by name, so
 * that the order of choosing them changes nothing. What is plainly no table is refused at once; a declared type counts
 * for nothing.
 */
export async function receiveFiles(
  req: Request,
  res: Response,
  limits: { dataDir: string; mostBytes: number },
): Promise<ReceivedFile[]> {
  const take = multer({
    dest: await makeImportFolder(limits.dataDir),
    limits: { fileSize: limits.mostBytes, files: MOST_FILES, fields: 4, parts: MOST_FILES + 5 },
    defParamCharset: 'utf8',
  }).array('file');
  await new Promise<void>((resolve, reject) => {
    take(req, res, (error: unknown) => (error ? reject(asProblem(error, limits.mostBytes)) : resolve()));
  });
  const files = ((req.files ?? []) as Express.Multer.File[])
    .map(({ path, originalname, size }) => ({
      path,
      name: originalname.normalize('NFC').slice(0, 255) || 'file',
      size,
    }))
    .sort((a, b) => inOrder.compare(a.name, b.name));
  try {
    if (files.length === 0) throw new ProblemError(400, { detail: 'Send at least one file, in the field "file".' });
    if (files.reduce((sum, { size }) => sum + size, 0) > limits.mostBytes) throw tooLarge(limits.mostBytes);
    for (const file of files) await refuseNoTable(file, files.length > 1);
  } catch (error) {
    await dropReceived(files);
    throw error;
  }
  return files;
}

/** Removes what was received and is not kept. */
export async function dropReceived(files: readonly ReceivedFile[]): Promise<void> {
  await Promise.all(files.map(({ path }) => dropFile(path)));
}

const inOrder = new Intl.Collator('en', { numeric: true });

async function refuseNoTable({ path, name }: ReceivedFile, isNamed: boolean): Promise<void> {
  try {
    refuseNotText(await firstBytes(path));
  } catch (error) {
    if (!(error instanceof FileRefusal)) throw error;
    throw new ProblemError(422, { name: 'no-table', detail: isNamed ? `“${name}”: ${error.message}` : error.message });
  }
}

async function firstBytes(path: string): Promise<Buffer> {
  const handle = await open(path);
  try {
    const { buffer, bytesRead } = await handle.read(Buffer.alloc(64 * 1024));
    return buffer.subarray(0, bytesRead);
  } finally {
    await handle.close();
  }
}

const tooLarge = (mostBytes: number) =>
  new ProblemError(413, {
    detail: `Files may have ${Math.floor(mostBytes / 1024 / 1024)} MB at most, all together.`,
  });

function asProblem(error: unknown, mostBytes: number): unknown {
  const code = (error as { code?: unknown }).code;
  if (code === 'LIMIT_FILE_SIZE') return tooLarge(mostBytes);
  if (code === 'LIMIT_FILE_COUNT') return new ProblemError(400, { detail: `Send ${MOST_FILES} files at most.` });
  if (code === 'ENOSPC') return new ProblemError(507, { detail: 'The disk is full; nothing was saved.' });
  return new ProblemError(400, { detail: 'The upload was broken off or is malformed. Send it again.' });
}
