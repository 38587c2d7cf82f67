import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex, concatBytes, utf8ToBytes } from '@noble/hashes/utils.js';
import { canonicalBytes } from './canonical-bytes';

const COMMAND_PREFIX = 'fascicle-command-1\n';

/**
 * Digest of what a command asked, kept in each of its entries.
 *
 * A command id that comes twice with the same digest is a repeat and is answered with what was committed; with another
 * digest it is a mistake and is refused. Leave out what differs between two sendings of one command.
 *
 * @param command the command as plain JSON, without its id; not modified
 * @returns 64 lower-case hexadecimal digits
 * @throws {RangeError} when the command is not plain JSON
 * @source house rule; SHA-256 over RFC 8785 bytes
 * @example commandDigest({ name: 'open-case', clockOffsetMs: null }).length // 64
 */
export function commandDigest(command: unknown): string {
  return bytesToHex(sha256(concatBytes(utf8ToBytes(COMMAND_PREFIX), canonicalBytes(command))));
}
