import { closeSync, fstatSync, openSync, readSync } from 'node:fs';

const CHUNK = 64 * 1024;

/** A file's bytes, to be gone through from the start as often as needed. */
export interface ByteSource {
  readonly size: number;
  chunks(): Iterable<Buffer>;
}

/** Bytes in memory. */
export function bytesOf(bytes: Buffer): ByteSource {
  return {
    size: bytes.length,
    *chunks() {
      for (let at = 0; at < bytes.length; at += CHUNK) yield bytes.subarray(at, at + CHUNK);
    },
  };
}

/** A file on disk, 64 kB at a time: larger pieces cost the parser time and memory. */
export function bytesOfFile(path: string): ByteSource {
  const withFile = <T>(work: (handle: number) => T): T => {
    const handle = openSync(path, 'r');
    try {
      return work(handle);
    } finally {
      closeSync(handle);
    }
  };
  return {
    size: withFile((handle) => fstatSync(handle).size),
    *chunks() {
      const handle = openSync(path, 'r');
      try {
        for (;;) {
          const buffer = Buffer.allocUnsafe(CHUNK);
          const length = readSync(handle, buffer, 0, CHUNK, null);
          if (length === 0) return;
          yield buffer.subarray(0, length);
        }
      } finally {
        closeSync(handle);
      }
    },
  };
}

/** The whole file in memory, for formats that cannot be read from the start on. */
export function allBytes(source: ByteSource): Buffer {
  return Buffer.concat([...source.chunks()]);
}
