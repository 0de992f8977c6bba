import { inflateSync } from 'node:zlib';

const WOFF_HEADER = 44;
const WOFF_ENTRY = 20;
const SFNT_HEADER = 12;
const SFNT_ENTRY = 16;

interface FontTable {
  tag: string;
  checksum: number;
  bytes: Buffer;
}

function readTable(woff: Buffer, entry: number): FontTable {
  const offset = woff.readUInt32BE(entry + 4);
  const stored = woff.readUInt32BE(entry + 8);
  const length = woff.readUInt32BE(entry + 12);
  const bytes = woff.subarray(offset, offset + stored);
  return {
    tag: woff.toString('latin1', entry, entry + 4),
    checksum: woff.readUInt32BE(entry + 16),
    // A table that would not get smaller is stored as it is.
    bytes: stored < length ? inflateSync(bytes) : bytes,
  };
}

const inFours = (length: number) => Math.ceil(length / 4) * 4;

/** The search hints in the header of an OpenType font file, from its number of tables. */
function header(flavour: number, tables: number): Buffer {
  const bytes = Buffer.alloc(SFNT_HEADER);
  const power = Math.floor(Math.log2(tables));
  bytes.writeUInt32BE(flavour, 0);
  bytes.writeUInt16BE(tables, 4);
  bytes.writeUInt16BE(2 ** power * SFNT_ENTRY, 6);
  bytes.writeUInt16BE(power, 8);
  bytes.writeUInt16BE((tables - 2 ** power) * SFNT_ENTRY, 10);
  return bytes;
}

/**
 * Unpacks a WOFF file to the OpenType font within, so that its tables are not inflated anew for each document.
 * Source: W3C Recommendation WOFF File Format 1.0, sections 3 to 5.
 *
 * @throws {Error} for bytes that are not WOFF 1.0
 */
export function sfntOf(woff: Buffer): Buffer {
  if (woff.toString('latin1', 0, 4) !== 'wOFF') throw new Error('The font file is not WOFF 1.0.');
  const count = woff.readUInt16BE(12);
  const tables = Array.from({ length: count }, (_, nth) => readTable(woff, WOFF_HEADER + nth * WOFF_ENTRY));
  const directory = Buffer.alloc(count * SFNT_ENTRY);
  const parts = [header(woff.readUInt32BE(4), count), directory];
  let offset = SFNT_HEADER + directory.length;
  for (const [nth, { tag, checksum, bytes }] of tables.entries()) {
    const entry = nth * SFNT_ENTRY;
    directory.write(tag, entry, 'latin1');
    directory.writeUInt32BE(checksum, entry + 4);
    directory.writeUInt32BE(offset, entry + 8);
    directory.writeUInt32BE(bytes.length, entry + 12);
    const padded = inFours(bytes.length);
    parts.push(bytes, Buffer.alloc(padded - bytes.length));
    offset += padded;
  }
  return Buffer.concat(parts);
}
