/** Largest header of a log entry, in bytes. */
export const HEADER_BYTES = 128 * 1024;
/** Largest part of an entry, in bytes. */
export const PART_BYTES = 256 * 1024;
/** Largest bundle file, in bytes. */
export const BUNDLE_BYTES = 64 * 1024 * 1024;
/** Largest signed note, in bytes; it leaves room for far more than the 16 signatures C2SP demands. */
export const NOTE_BYTES = 64 * 1024;
/** Largest credential or standing, in bytes of its compact form. */
export const JWS_BYTES = 256 * 1024;
/** Most photos one entry may name. */
export const PHOTOS_PER_ENTRY = 100;
/** Most entries one case may have; the log's own chain has no such limit. */
export const ENTRIES_PER_CASE = 1000;
/** Deepest nesting of objects and arrays in any JSON that is read. */
export const JSON_DEPTH = 32;
/** Most hashes a proof may hold: a tree of 2^53 leaves needs fewer. */
export const PROOF_HASHES = 63;
