import { createHash } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { mkdir, open, rename, rm } from 'node:fs/promises';
import path from 'node:path';
import { pipeline } from 'node:stream/promises';

/** Where uploaded files lie, below everything else that the server writes. */
export const importFolder = (dataDir: string) => path.join(dataDir, 'imports');

/** The file of an import, under its random id: the name that it was given is only text. */
export const importPath = (dataDir: string, importId: string) => path.join(importFolder(dataDir), importId);

/** Makes the folder of uploads, if need be. */
export async function makeImportFolder(dataDir: string): Promise<string> {
  const folder = importFolder(dataDir);
  await mkdir(folder, { recursive: true });
  return folder;
}

/** Moves an uploaded file to its place, durably: file, name and folder are on disk before any row names it. */
export async function keepFile(temporary: string, kept: string): Promise<void> {
  await syncToDisk(temporary, 'r+');
  await rename(temporary, kept);
  await syncToDisk(path.dirname(kept), 'r');
}

async function syncToDisk(place: string, flags: string): Promise<void> {
  const handle = await open(place, flags);
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
}

export async function dropFile(file: string): Promise<void> {
  await rm(file, { force: true });
}

/** SHA-256 of a file, as hex. */
export async function fileHash(file: string): Promise<string> {
  const hash = createHash('sha256');
  await pipeline(createReadStream(file), hash);
  return hash.digest('hex');
}
