import { Writable } from 'node:stream'
import { describe, expect, it } from 'vitest'
import { createLog } from '../../server/log.js'

function collect() {
  const lines: string[] = []
  const sink = new Writable({
    write(chunk: Buffer, _encoding, done) {
      lines.push(chunk.toString())
      done()
    },
  })
  return { lines, log: createLog({ logLevel: 'info' }, sink) }
}

describe('createLog', () => {
  it('tells of an error and its cause, and nothing of the values it carries along', () => {
    const { lines, log } = collect()
    const cause = Object.assign(new Error('The connection was lost.'), {
      code: 'ECONNRESET',
      address: '192.0.2.1',
    })
    const error = Object.assign(new TypeError('The statement failed.', { cause }), {
      parameters: ['typed words'],
    })
    log.error({ err: error }, 'A request failed.')
    const line = JSON.parse(lines[0]!)
    expect(line).toMatchObject({
      msg: 'A request failed.',
      err: { type: 'TypeError', message: 'The statement failed.', cause: { code: 'ECONNRESET' } },
    })
    expect(line.err.stack).toContain('log.test')
    expect(lines.join('')).not.toMatch(/typed words|192\.0\.2\.1/)
  })

  it('leaves out what is below its level', () => {
    const { lines, log } = collect()
    log.debug('Not this.')
    log.warn('This.')
    expect(lines).toHaveLength(1)
  })
})
