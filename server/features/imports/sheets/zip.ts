import { Inflate } from 'fflate';
import { damaged, locked, tooLarge } from './faulty.ts';
import { directory, type Part } from './zip-directory.ts';

const MOST_UNPACKED = 500 * 1024 * 1024;
// What people type shrinks to a twentieth or so; what is made to burst a reader, to a thousandth.
const HIGHEST_RATIO = 200;
const SURE_TO_BE_TYPED = 32 * 1024 * 1024;
const CHUNK = 16 * 1024;
const LOCAL_LENGTH = 30;

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
    // The unpacker numbers its errors; all others are of those who hear the pieces.
    throw error instanceof Error && 'code' in error && typeof error.code === 'number' ? damaged() : error;
  }
  if (!isWhole) throw damaged();
}

function bodyOf(bytes: Buffer, { at, packed }: Part): Buffer {
  if (at + LOCAL_LENGTH > bytes.length) throw damaged();
  const start = at + LOCAL_LENGTH + bytes.readUInt16LE(at + 26) + bytes.readUInt16LE(at + 28);
  if (start + packed > bytes.length) throw damaged();
  return bytes.subarray(start, start + packed);
}
