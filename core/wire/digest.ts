import { sha256 } from '@noble/hashes/sha2.js'
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils.js'
import canonicalize from 'canonicalize'

/**
 * SHA-256, in lower-case hexadecimal, of the RFC 8785 canonical form of a JSON value.
 * Give it a parsed input: defaults filled in, so that an omitted default and a written one share a digest.
 */
export function digestOf(value: unknown): string {
  const canonical = canonicalize(value)
  if (canonical === undefined) throw new TypeError('only JSON values have a digest')
  return bytesToHex(sha256(utf8ToBytes(canonical)))
}
