import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex, concatBytes, utf8ToBytes } from '@noble/hashes/utils.js';

/** Stands before the bytes of every entry, so that no other document can have an entry's hash. */
export const ENTRY_PREFIX = 'fascicle-entry-1\n';

/**
 * Hash of an entry from its canonical bytes.
 *
 * SHA-256 over the prefix and the exact bytes as stored. Pure JavaScript on both sides, because a browser's own hashing
 * is there only over https. Does not look into the bytes: `verifyChain` does.
 *
 * @param bytes canonical bytes of the entry; not modified
 * @returns 64 lower-case hexadecimal digits
 * @source FIPS 180-4 (SHA-256); the prefix is a house rule
 * @accuracy tests/lib/record/entry-hash.test.ts, against node:crypto
 * @example entryHash(canonicalBytes(entry)).length // 64
 */
export function entryHash(bytes: Uint8Array): string {
  return bytesToHex(sha256(concatBytes(utf8ToBytes(ENTRY_PREFIX), bytes)));
}
