import { Inflate } from 'fflate';
import { FileRefusal } from '../refusal.ts';

const MOST_PARTS = 2_000;
const MOST_UNPACKED = 500 * 1024 * 1024;
// What people type shrinks to a twentieth or so; what is made to burst a reader, to a thousandth.
const HIGHEST_RATIO = 200;
const SURE_TO_BE_TYPED = 32 * 1024 * 1024;
const CHUNK = 16 * 1024;
const END = 0x06054b50;
const ENTRY = 0x02014b50;
const END_LENGTH = 22;
const ENTRY_LENGTH = 46;
const LOCAL_LENGTH = 30;

interface Part {
  readonly method: number;
  readonly isEncrypted: boolean;
  readonly packed: number;
  readonly at: number;
}

/** Hears the bytes of a part, piece by piece. */
export type OnPiece = (piece: Uint8Array) => void;

/**
 * The parts of a zip archive in memory, unpacked piece by piece: no part is ever held whole. Nothing that the archive
 * says of itself is trusted: sizes are counted while unpacking. Throws a FileRefusal.
 */
export function openZip(bytes: Buffer) {
  const parts = directory(bytes);
  let unpacked = 0;

  /** Gives the bytes of a part; false = there is no such part. */
  function read(name: string, onPiece: OnPiece): boolean {
    const part = parts.get(name.toLowerCase());
    if (!part) return false;
    if (part.isEncrypted) throw locked();
    const body = bodyOf(bytes, part);
    let own = 0;
    const count = (piece: Uint8Array) => {
      own += piece.length;
      unpacked += piece.length;
      if (unpacked > MOST_UNPACKED || (own > SURE_TO_BE_TYPED && own > body.length * HIGHEST_RATIO)) throw tooLarge();
      onPiece(piece);
    };
    if (part.method === 8) inflate(body, count);
    else if (part.method === 0) count(body);
    else throw damaged();
    return true;
  }

  return { read, has: (name: string) => parts.has(name.toLowerCase()), names: [...parts.keys()] };
}
export type Zip = ReturnType<typeof openZip>;

/** Said of a workbook that only a password opens. */
export const locked = () =>
  new FileRefusal(
    'locked',
    'This workbook is protected by a password. Open it, save a copy without one, and bring that in.',
  );
/** Said of a workbook that ends too early or holds bytes that are none of its format. */
export const damaged = () =>
  new FileRefusal(
    'damaged',
    'This workbook is cut off or damaged. Open it in your spreadsheet program, save it anew, and bring that in.',
  );
const tooLarge = () =>
  new FileRefusal(
    'too-large',
    'Unpacked, this workbook is larger than anything people type. Save the sheet as CSV and bring that in.',
  );

function inflate(body: Buffer, onPiece: OnPiece): void {
  let isWhole = false;
  const stream = new Inflate((piece, isLast) => {
    isWhole = isLast;
    if (piece.length > 0) onPiece(piece);
  });
  try {
    for (let at = 0; at < body.length; at += CHUNK) {
      stream.push(body.subarray(at, at + CHUNK), at + CHUNK >= body.length);
    }
  } catch (error) {
    throw error instanceof FileRefusal ? error : damaged();
  }
  if (!isWhole) throw damaged();
}

/** Reads the list of parts that stands at the archive's end. */
function directory(bytes: Buffer): Map<string, Part> {
  const end = endOf(bytes);
  const count = bytes.readUInt16LE(end + 10);
  if (count > MOST_PARTS) throw tooLarge();
  const parts = new Map<string, Part>();
  let at = bytes.readUInt32LE(end + 16);
  for (let i = 0; i < count; i++) {
    if (at + ENTRY_LENGTH > bytes.length || bytes.readUInt32LE(at) !== ENTRY) throw damaged();
    const lengths = [28, 30, 32].map((place) => bytes.readUInt16LE(at + place));
    const [nameLength = 0] = lengths;
    const name = bytes.toString('utf8', at + ENTRY_LENGTH, at + ENTRY_LENGTH + nameLength);
    parts.set(name.toLowerCase(), {
      method: bytes.readUInt16LE(at + 10),
      isEncrypted: (bytes.readUInt16LE(at + 8) & 1) === 1,
      packed: bytes.readUInt32LE(at + 20),
      at: bytes.readUInt32LE(at + 42),
    });
    at += ENTRY_LENGTH + lengths.reduce((sum, length) => sum + length, 0);
  }
  return parts;
}

function endOf(bytes: Buffer): number {
  const first = Math.max(0, bytes.length - END_LENGTH - 0xffff);
  for (let at = bytes.length - END_LENGTH; at >= first; at--) if (bytes.readUInt32LE(at) === END) return at;
  throw damaged();
}

function bodyOf(bytes: Buffer, { at, packed }: Part): Buffer {
  if (at + LOCAL_LENGTH > bytes.length) throw damaged();
  const start = at + LOCAL_LENGTH + bytes.readUInt16LE(at + 26) + bytes.readUInt16LE(at + 28);
  if (start + packed > bytes.length) throw damaged();
  return bytes.subarray(start, start + packed);
}
