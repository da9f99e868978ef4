import { damaged, tooLarge } from './faulty.ts';

const MOST_PARTS = 2_000;
const [END, END_LENGTH] = [0x06054b50, 22];
const [ENTRY, ENTRY_LENGTH] = [0x02014b50, 46];
const [WIDE_END, WIDE_END_LENGTH] = [0x06064b50, 56];
const [WIDE_POINTER, WIDE_POINTER_LENGTH] = [0x07064b50, 20];
// What stands where a number does not fit, and the extra field that holds it then.
const TOO_WIDE = 0xffffffff;
const WIDE = 1;

/** One part of an archive, as its list says. */
export interface Part {
  readonly method: number;
  readonly isEncrypted: boolean;
  /** Bytes that it takes in the archive. */
  readonly packed: number;
  readonly at: number;
}

/** Reads the list of parts that stands at the archive's end. */
export function directory(bytes: Buffer): Map<string, Part> {
  const { count, first } = listOf(bytes);
  if (count > MOST_PARTS) throw tooLarge();
  const parts = new Map<string, Part>();
  let packed = 0;
  let at = first;
  for (let i = 0; i < count; i++) {
    if (at + ENTRY_LENGTH > bytes.length || bytes.readUInt32LE(at) !== ENTRY) throw damaged();
    const lengths = [28, 30, 32].map((place) => bytes.readUInt16LE(at + place));
    const [nameLength = 0] = lengths;
    const name = bytes.toString('utf8', at + ENTRY_LENGTH, at + ENTRY_LENGTH + nameLength);
    const extra = bytes.subarray(at + ENTRY_LENGTH + nameLength, at + ENTRY_LENGTH + nameLength + (lengths[1] ?? 0));
    const part = {
      method: bytes.readUInt16LE(at + 10),
      isEncrypted: (bytes.readUInt16LE(at + 8) & 1) === 1,
      ...wideSizes(extra, [20, 24, 42].map((place) => bytes.readUInt32LE(at + place)) as [number, number, number]),
    };
    parts.set(placeInside(name), part);
    packed += part.packed;
    // Parts that share their bytes unpack to any size.
    if (packed > bytes.length) throw damaged();
    at += ENTRY_LENGTH + lengths.reduce((sum, length) => sum + length, 0);
  }
  return parts;
}

/** A part by its name as other parts write it; some programs part folders the other way. */
const placeInside = (name: string) => name.replaceAll('\\', '/').replace(/^\/+/, '').toLowerCase();

/** Sizes and places that do not fit 32 bits stand in an extra field, in this order and only where needed. */
function wideSizes(extra: Buffer, [packed, raw, at]: [packed: number, raw: number, at: number]) {
  let field = 0;
  while (field + 4 <= extra.length && extra.readUInt16LE(field) !== WIDE) field += 4 + extra.readUInt16LE(field + 2);
  let next = field + 4;
  const wide = (value: number) => {
    if (value !== TOO_WIDE || next + 8 > extra.length) return value;
    next += 8;
    return Number(extra.readBigUInt64LE(next - 8));
  };
  wide(raw);
  return { packed: wide(packed), at: wide(at) };
}

/** How many parts are listed, and where the list begins. Where that does not fit, a wider record before the end says it. */
function listOf(bytes: Buffer): { count: number; first: number } {
  const end = endOf(bytes);
  const count = bytes.readUInt16LE(end + 10);
  const first = bytes.readUInt32LE(end + 16);
  if (count !== 0xffff && first !== TOO_WIDE) return { count, first };
  const pointer = end - WIDE_POINTER_LENGTH;
  if (pointer < 0 || bytes.readUInt32LE(pointer) !== WIDE_POINTER) throw damaged();
  const record = Number(bytes.readBigUInt64LE(pointer + 8));
  if (record + WIDE_END_LENGTH > bytes.length || bytes.readUInt32LE(record) !== WIDE_END) throw damaged();
  return { count: Number(bytes.readBigUInt64LE(record + 32)), first: Number(bytes.readBigUInt64LE(record + 48)) };
}

function endOf(bytes: Buffer): number {
  const first = Math.max(0, bytes.length - END_LENGTH - 0xffff);
  for (let at = bytes.length - END_LENGTH; at >= first; at--) if (bytes.readUInt32LE(at) === END) return at;
  throw damaged();
}
