import iconv from 'iconv-lite';
import { FileRefusal } from '../refusal.ts';
import type { ByteSource } from './bytes.ts';

export type Encoding = 'utf-8' | 'utf-16le' | 'utf-16be' | 'windows-1252';

const PICTURE = 'This is a picture, whatever its name says. Workbooks and spreadsheets saved as text can be read.';
const SIGNATURES: readonly (readonly [string, string])[] = [
  [
    'd0cf11e0',
    'This is a workbook of the old kind (.xls), or one protected by a password. Open it, save it as .xlsx without a password, and bring that in.',
  ],
  ['25504446', 'This is a PDF. Workbooks and spreadsheets saved as text can be read.'],
  ['89504e47', PICTURE],
  ['ffd8ff', PICTURE],
  ['47494638', PICTURE],
  ['1f8b', 'This is a compressed file. Unpack it first, then bring in the CSV inside.'],
];

/**
 * How the file's letters are stored: a mark at its start, the zeros of UTF-16, valid UTF-8, and else
 * Windows-1252. Throws a FileRefusal for what is no text.
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
  return isUtf8(source) ? 'utf-8' : 'windows-1252';
}

/** Throws a FileRefusal when a file's first bytes are those of a workbook, picture or archive, or there are none. */
export function refuseNotText(head: Buffer): void {
  if (head.length === 0) throw new FileRefusal('empty', 'The file is empty.');
  const start = head.toString('hex', 0, 4);
  const known = SIGNATURES.find(([signature]) => start.startsWith(signature));
  if (known) throw new FileRefusal('not-text', known[1]);
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

function isUtf8(source: ByteSource): boolean {
  const decoder = new TextDecoder('utf-8', { fatal: true });
  try {
    for (const chunk of source.chunks()) decoder.decode(chunk, { stream: true });
    decoder.decode();
    return true;
  } catch {
    return false;
  }
}

/**
 * The file as pieces of text, without its mark and with every line end as `\n`. Windows-1252 goes through
 * iconv-lite, because Node's own decoder loses € and the typographic quotes.
 */
export function* decode(source: ByteSource, encoding: Encoding): Generator<string> {
  const decoder = encoding === 'windows-1252' ? null : new TextDecoder(encoding);
  let held = '';
  for (const chunk of source.chunks()) {
    let text = held + (decoder ? decoder.decode(chunk, { stream: true }) : iconv.decode(chunk, encoding));
    held = text.endsWith('\r') ? '\r' : '';
    if (held) text = text.slice(0, -1);
    yield text.includes('\r') ? text.replace(/\r\n?/g, '\n') : text;
  }
  const rest = held + (decoder?.decode() ?? '');
  if (rest) yield rest.replace(/\r\n?/g, '\n');
}
