import { createHash } from 'node:crypto'

/** A random namespace of ours (RFC 9562, section 6.5); changing it would give every invented item a new id. */
const NAMESPACE = Buffer.from('6f2d0b1c8a5e4c3f9b7d21e4a8c6f013', 'hex')

/** The id of an invented item, the same in every installation: a name-based UUID, version 5 (RFC 9562, section 5.5). */
export function toItemId(name: string): string {
  const bytes = createHash('sha1').update(NAMESPACE).update(name, 'utf8').digest().subarray(0, 16)
  bytes.writeUInt8((bytes.readUInt8(6) & 0x0f) | 0x50, 6)
  bytes.writeUInt8((bytes.readUInt8(8) & 0x3f) | 0x80, 8)
  const hex = bytes.toString('hex')
  return [hex.slice(0, 8), hex.slice(8, 12), hex.slice(12, 16), hex.slice(16, 20), hex.slice(20)].join('-')
}
