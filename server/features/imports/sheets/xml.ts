import { isAscii } from 'node:buffer';
import { FileRefusal } from '../refusal.ts';
import { XmlFault, type XmlHearer, XmlScanner } from './xml-scanner.ts';
import { damaged, tooLarge } from './faulty.ts';
import type { Zip } from './zip.ts';

// What XML forbids, control characters above all; one of them stands between the cells that are kept of a workbook.
const FORBIDDEN = /[^\t\n\r -\ufffd]/;

/**
 * Goes through a part of an archive that is XML, piece by piece; false = there is no such part. Throws a FileRefusal
 * for XML that is malformed, that declares a document type, or whose letters are neither UTF-8 nor UTF-16.
 */
export function readXml(zip: Zip, part: string, hearer: XmlHearer): boolean {
  const scanner = new XmlScanner(hearer);
  let decode: ((piece?: Uint8Array) => string) | null = null;
  return orRefuse(() => {
    const isThere = zip.read(part, (piece) => {
      decode ??= decoderFor(piece);
      scanner.write(decode(piece));
    });
    if (!isThere) return false;
    scanner.write(decode?.() ?? '');
    scanner.end();
    return true;
  });
}

/** Is an attribute of yes or no set? */
export const isYes = (value: string | undefined) => value === '1' || value === 'true';

/** Decodes pieces, with every line end as `\n`; called without one, gives what is left. */
function decoderFor(first: Uint8Array): (piece?: Uint8Array) => string {
  const mark = ((first[0] ?? 0) << 8) | (first[1] ?? 0);
  const encoding =
    mark === 0xfffe || mark === 0x3c00 ? 'utf-16le' : mark === 0xfeff || mark === 0x3c ? 'utf-16be' : 'utf-8';
  const decoder = new TextDecoder(encoding, { fatal: true });
  let held = '';
  let isBetweenLetters = encoding === 'utf-8';
  const decode = (piece: Uint8Array) => {
    // Most of a workbook is ASCII, which need not be decoded; only after a whole letter, though.
    if (isBetweenLetters && isAscii(piece)) return latin(piece);
    isBetweenLetters = encoding === 'utf-8' && (piece.at(-1) ?? 0) < 0x80;
    return decoder.decode(piece, { stream: true });
  };
  return (piece) => {
    let text = held + (piece ? decode(piece) : decoder.decode());
    if (FORBIDDEN.test(text)) throw new XmlFault();
    if (!text.includes('\r')) {
      held = '';
      return text;
    }
    held = piece && text.endsWith('\r') ? '\r' : '';
    if (held) text = text.slice(0, -1);
    return text.replace(/\r\n?/g, '\n');
  };
}

const latin = ({ buffer, byteOffset, byteLength }: Uint8Array) =>
  Buffer.from(buffer, byteOffset, byteLength).toString('latin1');

function orRefuse(read: () => boolean): boolean {
  try {
    return read();
  } catch (error) {
    if (error instanceof FileRefusal) throw error;
    if (error instanceof XmlFault && error.kind === 'document type') {
      throw new FileRefusal(
        'damaged',
        'This workbook carries a document type definition; no spreadsheet program writes one.',
      );
    }
    if (error instanceof XmlFault && error.kind === 'too long') throw tooLarge();
    const isBroken = error instanceof XmlFault || (error instanceof TypeError && 'code' in error);
    throw isBroken ? damaged() : error;
  }
}
