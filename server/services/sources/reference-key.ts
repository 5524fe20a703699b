import { createHash } from 'node:crypto'

/**
 * A full reference reduced to what two compilers' ways of printing it share: lower case, no accents, letters and digits only,
 * one space between words. Two references are the same study where these agree.
 */
export function normaliseReference(reference: string): string {
  return reference
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .toLowerCase()
    .replace(/[^\p{L}\p{N}]+/gu, ' ')
    .trim()
}

/** The key (SHA-256, hex) under which a full reference is found again, or null when it holds no word. */
export function toReferenceKey(reference: string | null): string | null {
  const normalised = reference === null ? '' : normaliseReference(reference)
  return normalised === '' ? null : createHash('sha256').update(normalised, 'utf8').digest('hex')
}
