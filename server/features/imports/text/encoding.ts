import { isAscii, isUtf8 } from 'node:buffer';
import iconv from 'iconv-lite';
import { FileRefusal } from '../refusal.ts';
import type { ByteSource } from './bytes.ts';
import { refuseNotText } from './not-text.ts';

export type Encoding = 'utf-8' | 'utf-16le' | 'utf-16be' | 'windows-1252' | 'iso-8859-15';

const [LINE_END, OLD_LINE_END] = [10, 13];
const LONGEST_LINE = 4 * 1024 * 1024;
// Windows-1252 gives these bytes no letter; a file with them is none of it.
const NO_LETTERS = [0x81, 0x8d, 0x8f, 0x90, 0x9d];
const EURO_IN_LATIN_9 = 0xa4;
const ANEW = 'Save the sheet anew as CSV in UTF-8 and bring that in.';

/**
 * How the file's letters are stored: a mark at its start, the zeros of UTF-16, valid UTF-8, and else Windows-1252 or,
 * where its euro sign says so, ISO-8859-15. Throws a FileRefusal for what is no text, and for letters that are damaged:
 * none is ever replaced in silence.
 */
export function findEncoding(source: ByteSource): Encoding {
  const [head = Buffer.alloc(0)] = source.chunks();
  refuseNotText(head);
  const start = head.toString('hex', 0, 4);
  if (start.startsWith('fffe')) return 'utf-16le';
  if (start.startsWith('feff')) return 'utf-16be';
  const [even, odd] = zeros(head);
  if (odd > head.length / 5 && even < head.length / 50) return 'utf-16le';
  if (even > head.length / 5 && odd < head.length / 50) return 'utf-16be';
  refuseZeros(source);
  const { whole, broken, firstBroken } = lettersByLine(source);
  if (broken === 0) return 'utf-8';
  if (start.startsWith('efbbbf') || whole > broken) refuseDamaged(firstBroken);
  return oneByteEncoding(source);
}

function zeros(bytes: Buffer): [even: number, odd: number] {
  let even = 0;
  let odd = 0;
  for (let i = 0; i < bytes.length; i++) {
    if (bytes[i] !== 0) continue;
    if (i % 2 === 0) even++;
    else odd++;
  }
  return [even, odd];
}

function refuseZeros(source: ByteSource): void {
  for (const chunk of source.chunks()) {
    if (chunk.includes(0)) throw new FileRefusal('not-text', 'The file holds zero bytes: it is damaged, or not text.');
  }
}

/** Lines with letters beyond ASCII that are UTF-8, and those that are not, the first of them by its number. */
function lettersByLine(source: ByteSource): { whole: number; broken: number; firstBroken: number } {
  const found = { whole: 0, broken: 0, firstBroken: 0 };
  let line = 0;
  const take = (bytes: Buffer) => {
    line++;
    if (isAscii(bytes)) return;
    if (isUtf8(bytes)) found.whole++;
    else if (found.broken++ === 0) found.firstBroken = line;
  };
  let held: Buffer = Buffer.alloc(0);
  for (const chunk of source.chunks()) {
    const mark = chunk.includes(LINE_END) ? LINE_END : OLD_LINE_END;
    const end = chunk.lastIndexOf(mark) + 1;
    const whole = end > 0 ? Buffer.concat([held, chunk.subarray(0, end)]) : null;
    held = whole ? chunk.subarray(end) : Buffer.concat([held, chunk]);
    // A line that long is refused when rows are read.
    if (held.length > LONGEST_LINE) break;
    if (whole && isAscii(whole)) line += count(whole, mark);
    else if (whole) for (const one of linesOf(whole, mark)) take(one);
  }
  if (held.length > 0) take(held);
  return found;
}

function* linesOf(bytes: Buffer, mark: number): Generator<Buffer> {
  let from = 0;
  for (let at = bytes.indexOf(mark); at >= 0; at = bytes.indexOf(mark, from)) {
    yield bytes.subarray(from, at + 1);
    from = at + 1;
  }
}

function count(bytes: Buffer, byte: number): number {
  let found = 0;
  for (let at = bytes.indexOf(byte); at >= 0; at = bytes.indexOf(byte, at + 1)) found++;
  return found;
}

function oneByteEncoding(source: ByteSource): Encoding {
  let hasEuro = false;
  let hasWindows = false;
  for (const chunk of source.chunks()) {
    if (NO_LETTERS.some((byte) => chunk.includes(byte))) {
      throw new FileRefusal('not-text', `The letters of this file are stored in a way that is not known. ${ANEW}`);
    }
    hasEuro ||= chunk.includes(EURO_IN_LATIN_9);
    hasWindows ||= chunk.some((byte) => byte >= 0x80 && byte < 0xa0);
  }
  return hasEuro && !hasWindows ? 'iso-8859-15' : 'windows-1252';
}

function refuseDamaged(line: number | null): never {
  const where = line === null ? 'Some of its letters' : `Letters on line ${line}`;
  throw new FileRefusal('not-text', `The file is damaged: ${where.toLowerCase()} cannot be read. ${ANEW}`, line);
}

/**
 * The file as pieces of text, without its mark and with every line end as `\n`. Encodings of one byte go through
 * iconv-lite, because Node's own decoder loses € and the typographic quotes.
 */
export function* decode(source: ByteSource, encoding: Encoding): Generator<string> {
  const next = decoderOf(encoding);
  let held = '';
  for (const chunk of source.chunks()) {
    let text = held + next(chunk);
    held = text.endsWith('\r') ? '\r' : '';
    if (held) text = text.slice(0, -1);
    yield text.includes('\r') ? text.replace(/\r\n?/g, '\n') : text;
  }
  const rest = held + next(null);
  if (rest) yield rest.replace(/\r\n?/g, '\n');
}

/** Decodes piece by piece; null = no more comes. */
function decoderOf(encoding: Encoding): (chunk: Buffer | null) => string {
  if (encoding === 'windows-1252' || encoding === 'iso-8859-15')
    return (chunk) => (chunk ? iconv.decode(chunk, encoding) : '');
  const decoder = new TextDecoder(encoding, { fatal: true });
  return (chunk) => {
    try {
      return chunk ? decoder.decode(chunk, { stream: true }) : decoder.decode();
    } catch {
      return refuseDamaged(null);
    }
  };
}
