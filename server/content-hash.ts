import { createHash } from 'node:crypto'
import canonicalize from 'canonicalize'

/** SHA-256 (hex) of a value's canonical JSON (RFC 8785): the address of an immutable row or record set. */
export function hashContent(content: unknown): string {
  const text = canonicalize(content)
  if (text === undefined) throw new TypeError('Only a JSON value has a content hash')
  return createHash('sha256').update(text, 'utf8').digest('hex')
}
