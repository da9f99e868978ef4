import { FileRefusal } from '../refusal.ts';
import type { ByteSource } from '../text/bytes.ts';
import { type OpenFile, openFile } from './open-file.ts';
import type { Sheet } from './sheet.ts';

/** A file as it was given: its name is only text. */
export interface GivenFile {
  readonly name: string;
  readonly source: ByteSource;
}

/**
 * Opens the files of one import as one workbook: sheets are numbered through all of them, and a text file among several
 * gets its file's name. A refusal names the file.
 */
export function openFiles(files: readonly GivenFile[]): OpenFile {
  const [only] = files;
  if (!only) throw new FileRefusal('empty', 'There is no file.');
  if (files.length === 1) return openFile(only.source);
  const opened = files.map(({ name, source }) => named(name, () => openFile(source)));
  let number = 0;
  const sheets = opened.flatMap((file, at) =>
    file.sheets.map((sheet): Sheet => {
      const { name } = files[at] as GivenFile;
      const forEachRow: Sheet['forEachRow'] = (onRow, onPart) => named(name, () => sheet.forEachRow(onRow, onPart));
      return { ...sheet, number: ++number, file: at + 1, name: sheet.name ?? withoutEnding(name), forEachRow };
    }),
  );
  const { encoding, delimiter } = opened[0] as OpenFile;
  return { encoding, delimiter, sheets };
}

const withoutEnding = (name: string) => name.replace(/\.[a-z0-9]{1,5}$/i, '') || name;

function named<T>(name: string, work: () => T): T {
  try {
    return work();
  } catch (error) {
    if (!(error instanceof FileRefusal)) throw error;
    throw new FileRefusal(error.kind, `“${name}”: ${error.message}`, error.row);
  }
}
