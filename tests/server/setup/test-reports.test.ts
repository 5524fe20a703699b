import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { countPlaywright, countVitest, readCount } from '../../../server/setup/test-reports.mjs'

const good = { status: 'passed', assertionResults: [{}] }
const broken = { status: 'failed', assertionResults: [] }

describe('counting tests', () => {
  test('adds files that could not be read to the tests that failed', () => {
    const report = { numPassedTests: 5, numFailedTests: 1, testResults: [good, broken] }
    expect(countVitest(report)).toEqual({ passed: 5, failed: 2 })
  })

  test('counts a browser test that only passed at the second try as failed', () => {
    expect(countPlaywright({ stats: { expected: 3, unexpected: 1, flaky: 1 }, errors: [{}] })).toEqual({
      passed: 3,
      failed: 3,
    })
  })
})

describe('reading a report', () => {
  let folder: string
  beforeAll(() => {
    folder = mkdtempSync(join(tmpdir(), 'reports-'))
    writeFileSync(
      join(folder, 'good.json'),
      JSON.stringify({ stats: { expected: 2, unexpected: 0, flaky: 0 } }),
    )
  })
  afterAll(() => rmSync(folder, { recursive: true }))

  test('takes the counts as they are when the tool ended well', () => {
    expect(readCount(join(folder, 'good.json'), countPlaywright, 0)).toEqual({ passed: 2, failed: 0 })
  })

  test('counts one failure when the tool failed and named none', () => {
    expect(readCount(join(folder, 'good.json'), countPlaywright, 1)).toEqual({ passed: 2, failed: 1 })
    expect(readCount(join(folder, 'missing.json'), countPlaywright, 'SIGKILL')).toEqual({
      passed: 0,
      failed: 1,
    })
  })
})
