import multer from 'multer';
import type { Request, Response } from 'express';
import { open } from 'node:fs/promises';
import { ProblemError } from '../../platform/problems.ts';
import { dropFile, makeImportFolder } from './files.ts';
import { FileRefusal } from './refusal.ts';
import { refuseNotText } from './text/encoding.ts';

export interface ReceivedFile {
  readonly path: string;
  readonly name: string;
  readonly size: number;
}

/**
 * Takes the uploaded file (field "file") to disk, within the limit. What is plainly no text is refused at once; its
 * name and its declared type count for nothing.
 */
export async function receiveFile(
  req: Request,
  res: Response,
  limits: { dataDir: string; mostBytes: number },
): Promise<ReceivedFile> {
  const take = multer({
    dest: await makeImportFolder(limits.dataDir),
    limits: { fileSize: limits.mostBytes, files: 1, fields: 4, parts: 6 },
    defParamCharset: 'utf8',
  }).single('file');
  await new Promise<void>((resolve, reject) => {
    take(req, res, (error: unknown) => (error ? reject(asProblem(error, limits.mostBytes)) : resolve()));
  });
  const { file } = req;
  if (!file) throw new ProblemError(400, { detail: 'Send one file, in the field "file".' });
  try {
    refuseNotText(await firstBytes(file.path));
  } catch (error) {
    await dropFile(file.path);
    if (error instanceof FileRefusal) throw new ProblemError(422, { name: 'no-table', detail: error.message });
    throw error;
  }
  return { path: file.path, name: file.originalname.normalize('NFC').slice(0, 255) || 'file', size: file.size };
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

function asProblem(error: unknown, mostBytes: number): unknown {
  if (error instanceof multer.MulterError && error.code === 'LIMIT_FILE_SIZE') {
    return new ProblemError(413, { detail: `A file may have ${Math.floor(mostBytes / 1024 / 1024)} MB at most.` });
  }
  const code = (error as { code?: unknown }).code;
  if (code === 'ENOSPC') return new ProblemError(507, { detail: 'The disk is full; nothing was saved.' });
  return new ProblemError(400, { detail: 'The upload was broken off or is malformed. Send it again.' });
}
