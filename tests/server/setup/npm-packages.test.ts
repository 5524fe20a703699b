import { describe, expect, test } from 'vitest'
import { findMissingPackages } from '../../../server/setup/npm-packages.mjs'

const wanted = {
  packages: {
    '': { version: '0.1.0' },
    'node_modules/alder': { version: '1.0.0' },
    'node_modules/birch': { version: '2.0.0' },
    'node_modules/birch-for-another-system': { version: '2.0.0', optional: true },
  },
}
const installed = {
  packages: { 'node_modules/alder': { version: '1.0.0' }, 'node_modules/birch': { version: '2.0.0' } },
}
const everywhere = () => true

describe('what is missing of the npm packages', () => {
  test('is nothing when all are there, save optional ones for other systems', () => {
    expect(findMissingPackages(wanted, installed, everywhere)).toEqual([])
  })

  test('is a package of another version', () => {
    const older = { packages: { ...installed.packages, 'node_modules/birch': { version: '1.9.0' } } }
    expect(findMissingPackages(wanted, older, everywhere)).toEqual(['node_modules/birch'])
  })

  test('is a package that was never installed', () => {
    const fewer = { packages: { 'node_modules/alder': { version: '1.0.0' } } }
    expect(findMissingPackages(wanted, fewer, everywhere)).toEqual(['node_modules/birch'])
  })

  test('is a package that npm listed and somebody deleted', () => {
    const isThere = (path: string) => path !== 'node_modules/alder'
    expect(findMissingPackages(wanted, installed, isThere)).toEqual(['node_modules/alder'])
  })
})
