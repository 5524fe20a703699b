import { createReadStream } from 'node:fs'
import { stat } from 'node:fs/promises'
import { createHash } from 'node:crypto'
import { Readable } from 'node:stream'
import Papa from 'papaparse'
import { InvalidInput } from '../../server/errors.js'

/** The largest file the importer reads, in bytes; the largest of the datasets has 3 MB. */
const MAX_FILE_BYTES = 64 * 1024 * 1024

/** One row of a table, by column name, with the line of the file it begins on (the header is line 1). */
export interface TableRow {
  line: number
  cells: Record<string, string>
}

export interface Table {
  rows: TableRow[]
  /** SHA-256 of the file's bytes. */
  sha256: Buffer
}

/**
 * Reads a CSV file (RFC 4180, comma, header row) as a stream. A file that is not strictly UTF-8, has other columns than
 * the expected, a row with too few or too many cells, or ends inside a row is refused whole with one sentence
 * (InvalidInput).
 */
export async function readTable(path: string, expectedHeader: readonly string[]): Promise<Table> {
  const size = await stat(path).then(
    (found) => found.size,
    () => {
      throw new InvalidInput(`The file ${path} cannot be read.`)
    },
  )
  if (size > MAX_FILE_BYTES)
    throw new InvalidInput(`The file has ${size} bytes, more than ${MAX_FILE_BYTES}.`)

  const hash = createHash('sha256')
  let lastCharacter = ''
  const text = Readable.from(decode(path, hash, (chunk) => (lastCharacter = chunk.at(-1) ?? lastCharacter)))

  const rows: TableRow[] = []
  let line = 1
  let isHeader = true
  let afterEnd: number | null = null
  await new Promise<void>((resolve, reject) => {
    const refuse = (sentence: string) => {
      reject(new InvalidInput(sentence))
      text.destroy()
    }
    Papa.parse<string[]>(text, {
      delimiter: ',',
      quoteChar: '"',
      step: ({ data, errors }, parser) => {
        const at = line
        line += 1 + data.reduce((sum, cell) => sum + (cell.match(/\n/g)?.length ?? 0), 0)
        const sentence = findFault(data, errors, at)
        if (sentence !== null) {
          // Before the end of the parsing, which counts as its success.
          refuse(sentence)
          parser.abort()
        }
      },
      complete: () => {
        resolve()
      },
      error: (error: Error) => {
        reject(
          error instanceof InvalidInput
            ? error
            : new InvalidInput(`The file cannot be read: ${error.message}.`),
        )
      },
    })

    function findFault(data: string[], errors: Papa.ParseError[], at: number): string | null {
      if (errors.some(({ code }) => code === 'InvalidQuotes')) {
        return `Line ${at} has a quotation mark in the wrong place.`
      }
      if (errors.length > 0) {
        return `The file ends inside the quotation marks opened on line ${at}, so it is cut off.`
      }
      if (afterEnd !== null) return `Line ${afterEnd} is empty.`
      if (isHeader) {
        isHeader = false
        return describeHeaderFault(data, expectedHeader)
      }
      if (data.length === 1 && data[0] === '') {
        // The newline that ends the last row shows as one empty row; anything after it is a fault.
        afterEnd = at
        return null
      }
      if (data.length !== expectedHeader.length) {
        return `Line ${at} has ${data.length} columns instead of ${expectedHeader.length}.`
      }
      rows.push({
        line: at,
        cells: Object.fromEntries(expectedHeader.map((name, index) => [name, data[index] ?? ''])),
      })
      return null
    }
  })

  if (isHeader) throw new InvalidInput('The file is empty.')
  if (rows.length === 0) throw new InvalidInput('The file has a header and no rows.')
  if (lastCharacter !== '\n')
    throw new InvalidInput('The file does not end with a whole line, so it is cut off.')
  return { rows, sha256: hash.digest() }
}

async function* decode(
  path: string,
  hash: ReturnType<typeof createHash>,
  onChunk: (chunk: string) => void,
): AsyncGenerator<string> {
  const decoder = new TextDecoder('utf-8', { fatal: true })
  let bytesBefore = 0
  try {
    for await (const bytes of createReadStream(path) as AsyncIterable<Buffer>) {
      hash.update(bytes)
      const chunk = decoder.decode(bytes, { stream: true })
      bytesBefore += bytes.length
      if (chunk.includes('\0')) throw new InvalidInput('The file holds a zero byte, so it is no text.')
      if (chunk !== '') {
        onChunk(chunk)
        yield chunk
      }
    }
    decoder.decode()
  } catch (error) {
    if (error instanceof TypeError) {
      throw new InvalidInput(
        `The file is not UTF-8 text: bytes that mean nothing were met after byte ${bytesBefore}.`,
      )
    }
    throw error
  }
}

function describeHeaderFault(found: string[], expected: readonly string[]): string | null {
  const missing = expected.filter((name) => !found.includes(name))
  if (missing.length > 0)
    return `The file has other columns: ${missing.map((name) => `“${name}”`).join(', ')} is missing.`
  const extra = found.filter((name) => !expected.includes(name))
  if (extra.length > 0) return `The file has a column it should not have: “${extra[0]}”.`
  if (found.some((name, index) => name !== expected[index]) || found.length !== expected.length) {
    return 'The columns of the file stand in another order than expected.'
  }
  return null
}
