/** SHA-256, the fingerprint by which a study or a table is recognised; synchronous and the same in every runtime. */

import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils.js';

/**
 * SHA-256 of the bytes, or of a text in UTF-8, as 64 lower-case hexadecimal digits.
 *
 * Source: FIPS PUB 180-4 (2015), section 6.2, as implemented by @noble/hashes.
 */
export function sha256Hex(content: Uint8Array | string): string {
  return bytesToHex(sha256(typeof content === 'string' ? utf8ToBytes(content) : content));
}
