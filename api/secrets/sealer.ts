import { hkdfSync } from 'node:crypto'
import { CompactEncrypt, compactDecrypt } from 'jose'

/** Keeps text that must be read again, but not by whoever reads the database. */
export interface Sealer {
  seal(text: string): Promise<string>
  /** Throws for what was sealed by another secret, or altered. */
  open(sealed: string): Promise<string>
}

const KEY_BYTES = 32

/** AES-256-GCM with a key derived from the server's secret (HKDF, RFC 5869), written as a compact JWE (RFC 7516). */
export function sealer(secret: string): Sealer {
  const key = new Uint8Array(hkdfSync('sha256', secret, '', 'emberline sealed text', KEY_BYTES))
  return {
    seal: (text) =>
      new CompactEncrypt(new TextEncoder().encode(text))
        .setProtectedHeader({ alg: 'dir', enc: 'A256GCM' })
        .encrypt(key),
    async open(sealed) {
      const { plaintext } = await compactDecrypt(sealed, key, {
        keyManagementAlgorithms: ['dir'],
        contentEncryptionAlgorithms: ['A256GCM'],
      })
      return new TextDecoder().decode(plaintext)
    },
  }
}
