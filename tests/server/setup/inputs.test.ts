import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, test } from 'vitest'
import { hashBuildInputs, listFiles } from '../../../server/setup/inputs.mjs'

describe('the fingerprint of what is built', () => {
  let checkout: string
  beforeEach(() => {
    checkout = mkdtempSync(join(tmpdir(), 'inputs-'))
    for (const folder of ['server/setup', 'seeds/data', 'src', 'tests']) {
      mkdirSync(join(checkout, folder), { recursive: true })
    }
    write('server/app.ts', 'one')
    write('server/setup/run.mjs', 'one')
    write('seeds/seed.ts', 'one')
    write('seeds/data/species.csv', 'one')
    write('src/app.ts', 'one')
    write('tests/app.test.ts', 'one')
  })
  afterEach(() => rmSync(checkout, { recursive: true }))

  function write(name: string, content: string) {
    writeFileSync(join(checkout, name), content)
  }

  test.each(['server/app.ts', 'seeds/seed.ts', 'src/app.ts'])('changes with %s', (name) => {
    const before = hashBuildInputs(checkout)
    write(name, 'two')
    expect(hashBuildInputs(checkout)).not.toBe(before)
    write(name, 'one')
    expect(hashBuildInputs(checkout)).toBe(before)
  })

  test.each(['server/setup/run.mjs', 'seeds/data/species.csv', 'tests/app.test.ts'])(
    'does not change with %s, which is not built',
    (name) => {
      const before = hashBuildInputs(checkout)
      write(name, 'two')
      expect(hashBuildInputs(checkout)).toBe(before)
    },
  )

  test('changes when a file is added, removed or renamed', () => {
    const before = hashBuildInputs(checkout)
    write('src/view.ts', '')
    const added = hashBuildInputs(checkout)
    expect(added).not.toBe(before)
    rmSync(join(checkout, 'src/view.ts'))
    write('src/page.ts', '')
    expect(hashBuildInputs(checkout)).not.toBe(added)
    rmSync(join(checkout, 'src/page.ts'))
    expect(hashBuildInputs(checkout)).toBe(before)
  })

  test('lists files in one order, whatever order the names come in', () => {
    const names = ['src', 'server', 'missing']
    expect(listFiles(checkout, names, ['server/setup'])).toEqual(['server/app.ts', 'src/app.ts'])
    expect(listFiles(checkout, names.reverse(), ['server/setup'])).toEqual(['server/app.ts', 'src/app.ts'])
  })
})
