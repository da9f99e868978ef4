import type { RefusalKind } from '#shared/contracts/import-words.ts';

/** The whole file cannot come in: why, in words for the person who holds it, and on which line if one is to blame. */
export class FileRefusal extends Error {
  readonly kind: RefusalKind;
  readonly row: number | null;

  constructor(kind: RefusalKind, message: string, row: number | null = null) {
    super(message);
    this.kind = kind;
    this.row = row;
  }
}
