import { flushPromises } from '@vue/test-utils'
import { createSSRApp, h, ref } from 'vue'
import { renderToString } from 'vue/server-renderer'
import { describe, expect, it } from 'vitest'
import { ApiError } from '../../../src/api/api-error.js'
import { pageContextKey, type PageContext, type StoredRead } from '../../../src/composables/page-context.js'
import { useRead } from '../../../src/composables/useRead.js'
import { makeContext, runComposable } from '../../helpers/page-context.js'

describe('reading in the browser', () => {
  it('takes the answer the server left, and asks nothing', async () => {
    const { context, asked } = makeContext([{ path: '/home', answer: { total: 7 } }])
    const { result } = await runComposable(() => useRead<{ total: number }>(() => '/home'), context)
    expect(result.state.value).toBe('done')
    expect(result.data.value).toEqual({ total: 7 })
    expect(asked).toHaveLength(0)
  })

  it('drops an answer whose question has changed, in whatever order they arrive', async () => {
    const { context, asked } = makeContext()
    const path = ref('/species?q=bo')
    const { result } = await runComposable(() => useRead<string>(() => path.value), context)
    path.value = '/species?q=boa'
    await flushPromises()
    expect(asked.map((read) => read.path)).toEqual(['/species?q=bo', '/species?q=boa'])
    expect(asked[0]?.signal?.aborted).toBe(true)
    asked[1]?.resolve('boa')
    await flushPromises()
    asked[0]?.resolve('bo')
    await flushPromises()
    expect(result.data.value).toBe('boa')
    expect(result.state.value).toBe('done')
  })

  it('keeps the last answer in sight only where that is asked for', async () => {
    const { context, asked } = makeContext([{ path: '/a', answer: 'a' }])
    const path = ref('/a')
    const { result: kept } = await runComposable(
      () => useRead<string>(() => path.value, { keepsLast: true }),
      context,
    )
    const { result: dropped } = await runComposable(() => useRead<string>(() => path.value), context)
    path.value = '/b'
    await flushPromises()
    expect([kept.data.value, dropped.data.value]).toEqual(['a', null])
    expect([kept.state.value, dropped.state.value]).toEqual(['loading', 'loading'])
    for (const read of asked) read.resolve('b')
    await flushPromises()
    expect([kept.data.value, dropped.data.value]).toEqual(['b', 'b'])
  })

  it('says what failed, and reads again on request', async () => {
    const { context, asked } = makeContext()
    const { result } = await runComposable(() => useRead<string>(() => '/home'), context)
    asked[0]?.reject(new ApiError(0, 'offline', 'The server could not be reached.'))
    await flushPromises()
    expect(result.state.value).toBe('error')
    expect(result.error.value?.message).toBe('The server could not be reached.')
    void result.reload()
    asked[1]?.resolve('home')
    await flushPromises()
    expect(result.state.value).toBe('done')
    expect(result.error.value).toBeNull()
  })

  it('reads nothing for null', async () => {
    const { context, asked } = makeContext()
    const { result } = await runComposable(() => useRead<string>(() => null), context)
    expect(result.state.value).toBe('idle')
    expect(asked).toHaveLength(0)
  })
})

describe('reading on the server', () => {
  async function render(
    read: () => Promise<unknown>,
    isOptional = false,
  ): Promise<{ html: string; context: PageContext; reads: StoredRead[] }> {
    const reads: StoredRead[] = []
    const context: PageContext = {
      origin: 'https://moss.example',
      isServer: true,
      read,
      recall: () => null,
      store: (stored) => void reads.push(stored),
      response: { status: 200, location: null },
    }
    const app = createSSRApp({
      setup() {
        const { state, data } = useRead<string>(() => '/home', { isOptional })
        return () => h('p', `${state.value} ${data.value}`)
      },
    })
    app.provide(pageContextKey, context)
    return { html: await renderToString(app), context, reads }
  }

  it('waits for the answer and leaves it for the browser', async () => {
    const { html, reads, context } = await render(() => Promise.resolve('answer'))
    expect(html).toContain('done answer')
    expect(reads).toEqual([{ path: '/home', answer: 'answer' }])
    expect(context.response.status).toBe(200)
  })

  it('answers with the status of a read the page cannot do without', async () => {
    const refusal = new ApiError(404, 'not-found', 'There is no such page.')
    const { html, reads, context } = await render(() => Promise.reject(refusal))
    expect(html).toContain('error null')
    expect(context.response.status).toBe(404)
    expect(reads).toEqual([
      { path: '/home', error: { status: 404, code: 'not-found', message: 'There is no such page.' } },
    ])
  })

  it('keeps its own status where only a part failed', async () => {
    const { context } = await render(() => Promise.reject(new Error('connection lost')), true)
    expect(context.response.status).toBe(200)
  })
})
