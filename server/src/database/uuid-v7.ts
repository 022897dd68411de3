import { randomBytes } from 'node:crypto';

let lastMillisecond = 0;
let counter = 0;

/**
 * A new UUID version 7 (RFC 9562, section 5.7): 48 bits of Unix time in milliseconds, 12 bits of a
 * counter (section 6.2, method 1) so that ids made in one process sort as they were made, 62 random
 * bits.
 * @param now Unix time in milliseconds
 */
export function uuidV7(now: number = Date.now()): string {
  const bytes = randomBytes(16);
  if (now > lastMillisecond) {
    lastMillisecond = now;
    // Half the range stays free for ids of the same millisecond.
    counter = bytes.readUInt16BE(6) & 0x7ff;
  } else if (++counter > 0xfff) {
    lastMillisecond += 1;
    counter = 0;
  }
  bytes.writeUIntBE(lastMillisecond, 0, 6);
  bytes.writeUInt16BE(0x7000 | counter, 6);
  bytes[8] = 0x80 | (bytes[8]! & 0x3f);
  const hex = bytes.toString('hex');
  return [
    hex.slice(0, 8),
    hex.slice(8, 12),
    hex.slice(12, 16),
    hex.slice(16, 20),
    hex.slice(20),
  ].join('-');
}
