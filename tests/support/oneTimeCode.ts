import { createHmac } from 'node:crypto'

const SIGNS = 'ABCDEFGHIJKLMNOPQRSTUVWXYZ234567'

function fromBase32(text: string): Buffer {
  const bits = [...text].map((sign) => SIGNS.indexOf(sign).toString(2).padStart(5, '0')).join('')
  return Buffer.from((bits.match(/.{8}/g) ?? []).map((byte) => parseInt(byte, 2)))
}

/** What an app shows: RFC 6238 over RFC 4226, section 5.3, written out apart from the package the server uses. */
export function codeAt(secret: string, atMs: number): string {
  const counter = Buffer.alloc(8)
  counter.writeBigUInt64BE(BigInt(Math.floor(atMs / 30_000)))
  const mac = createHmac('sha1', fromBase32(secret)).update(counter).digest()
  const offset = (mac.at(-1) ?? 0) & 0xf
  return String((mac.readUInt32BE(offset) & 0x7fffffff) % 1_000_000).padStart(6, '0')
}
