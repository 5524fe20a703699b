import { describe, expect, it } from 'vitest'
import { createBrowserContext } from '../../../src/composables/browser-context.js'
import { defaultPreferences } from '../../../src/api/preferences.js'

function make(now: () => number) {
  return createBrowserContext(
    {
      origin: 'https://moss.example',
      preferences: defaultPreferences,
      reads: [{ path: '/home', answer: 1 }],
    },
    () => Promise.reject(new Error('not asked')),
    now,
  )
}

describe('the answers a tab keeps', () => {
  it('serve the way back for a minute', () => {
    let time = 0
    const context = make(() => time)
    context.store({ path: '/species', answer: 'rows' })
    time = 59_000
    expect(context.recall('/species')).toEqual({ path: '/species', answer: 'rows' })
    time = 61_000
    expect(context.recall('/species')).toBeNull()
  })

  it('hold no failure', () => {
    const context = make(() => 0)
    context.store({ path: '/species', error: { status: 503, code: 'unavailable', message: 'Later.' } })
    expect(context.recall('/species')).toBeNull()
  })

  it('give the page’s own answer on the first look, however long the script took to start', () => {
    let time = 0
    const context = make(() => time)
    time = 500_000
    expect(context.recall('/home')).toEqual({ path: '/home', answer: 1 })
    time = 600_000
    expect(context.recall('/home')).toBeNull()
  })

  it('are few', () => {
    const context = make(() => 0)
    for (let n = 0; n <= 30; n += 1) context.store({ path: `/species?cursor=${n}`, answer: n })
    expect(context.recall('/species?cursor=0')).toBeNull()
    expect(context.recall('/species?cursor=30')).not.toBeNull()
  })
})
