/** A value that JSON can hold. */
export type JsonValue = null | boolean | number | string | readonly JsonValue[] | { readonly [key: string]: JsonValue };

/** A JSON object. */
export type JsonObject = { readonly [key: string]: JsonValue };

/** Who wrote an entry, as they were known when they wrote it. */
export interface Author {
  readonly id: string;
  readonly role: string;
  readonly displayName: string;
}

/**
 * One line of a case's log: everything that the hash covers.
 * Hashes are 64 lower-case hexadecimal digits; times are RFC 3339 in UTC with milliseconds.
 */
export interface Entry {
  readonly format: 1;
  readonly hospitalId: string;
  readonly caseId: string;
  /** 1 for the first entry of a case, dense from there. */
  readonly seq: number;
  /** Hash of entry seq − 1; 64 zeros for the first. */
  readonly previousHash: string;
  readonly kind: string;
  readonly kindVersion: number;
  /** A UUIDv7, or an id derived from the fact such as `repeat/ulnar-1/3`; 1 to 120 characters. */
  readonly commandId: string;
  /** 0 for the first entry of a command, then 1, 2 … */
  readonly commandPart: number;
  readonly commandDigest: string;
  readonly eventAt: string;
  readonly recordedAt: string;
  readonly author: Author;
  readonly body: JsonObject;
}

/** An entry with its canonical bytes and their hash. */
export interface SealedEntry {
  readonly entry: Entry;
  readonly hash: string;
  readonly bytes: Uint8Array;
}

/** The end of a chain: number and hash of its last entry, and the time that the next one may not go below. */
export interface ChainHead {
  readonly seq: number;
  readonly hash: string;
  readonly recordedAt?: string;
}

/**
 * What an entry's `previousHash` says when nothing stands before it: 64 hexadecimal digits.
 * @source house rule
 */
export const NO_HASH = '0'.repeat(64);

/**
 * Head of a case without entries: number 0.
 * @source house rule
 */
export const EMPTY_HEAD: ChainHead = { seq: 0, hash: NO_HASH };
