import { createHash } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { mkdir, open, readdir, rename, rm } from 'node:fs/promises';
import path from 'node:path';
import { pipeline } from 'node:stream/promises';

/** Where uploaded files lie, below everything else that the server writes. */
export const importFolder = (dataDir: string) => path.join(dataDir, 'imports');

/** A file of an import, under its random id and its number: the name that it was given is only text. */
export const importPath = (dataDir: string, importId: string, number = 1) =>
  path.join(importFolder(dataDir), fileKey(importId, number));

/** What the file is called in the folder of uploads. */
const fileKey = (importId: string, number: number) => (number === 1 ? importId : `${importId}.${number}`);

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

/** Removes every uploaded file that no import needs: a stop of the server may have left some. */
export async function sweepFiles(
  dataDir: string,
  needed: readonly { importId: string; number: number }[],
): Promise<void> {
  const folder = await makeImportFolder(dataDir);
  const kept = new Set(needed.map(({ importId, number }) => fileKey(importId, number)));
  const orphans = (await readdir(folder)).filter((name) => !kept.has(name));
  await Promise.all(orphans.map((name) => dropFile(path.join(folder, name))));
}

/** SHA-256 of a file, as hex. */
export async function fileHash(file: string): Promise<string> {
  const hash = createHash('sha256');
  await pipeline(createReadStream(file), hash);
  return hash.digest('hex');
}
