import { createHash } from 'node:crypto';

/**
 * The id under which a rack's reading is kept: the same for the same rack, lot and own id, so that sending it twice
 * changes nothing. A UUID of version 8 (RFC 9562 section 5.8) from the first 128 bits of a SHA-256.
 */
export function ownReadingId(rackId: number, lotId: number, own: string): string {
  const bytes = createHash('sha256')
    .update(JSON.stringify([rackId, lotId, own]))
    .digest()
    .subarray(0, 16);
  bytes.writeUInt8((bytes.readUInt8(6) & 0x0f) | 0x80, 6);
  bytes.writeUInt8((bytes.readUInt8(8) & 0x3f) | 0x80, 8);
  const hex = bytes.toString('hex');
  return [hex.slice(0, 8), hex.slice(8, 12), hex.slice(12, 16), hex.slice(16, 20), hex.slice(20)].join('-');
}
