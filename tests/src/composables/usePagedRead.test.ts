import { flushPromises } from '@vue/test-utils'
import { ref } from 'vue'
import { beforeEach, describe, expect, it } from 'vitest'
import { ApiError } from '../../../src/api/api-error.js'
import { usePagedRead } from '../../../src/composables/usePagedRead.js'
import { makeContext, runComposable } from '../../helpers/page-context.js'

interface Answer {
  items: number[]
  nextCursor: string | null
}

beforeEach(() => window.history.replaceState(null, ''))

async function start(reads: { path: string; answer: Answer }[] = []) {
  const { context, asked } = makeContext(reads)
  const q = ref('a')
  const { result, wrapper } = await runComposable(
    () =>
      usePagedRead<Answer, number>({
        path: (cursor) => `/${q.value}/${cursor ?? 'first'}`,
        toItems: (answer) => answer.items,
        toNextCursor: (answer) => answer.nextCursor,
        keepsLast: true,
      }),
    context,
  )
  return { q, list: result, asked, context, wrapper }
}

describe('a list in pages', () => {
  it('adds the next rows below the earlier ones', async () => {
    const { list, asked } = await start([{ path: '/a/first', answer: { items: [1, 2], nextCursor: 'x' } }])
    const loading = list.loadMore()
    expect(list.isLoadingMore.value).toBe(true)
    void list.loadMore()
    expect(asked.map((read) => read.path)).toEqual(['/a/x'])
    asked[0]?.resolve({ items: [3], nextCursor: null })
    await loading
    expect(list.items.value).toEqual([1, 2, 3])
    expect(list.nextCursor.value).toBeNull()
    await list.loadMore()
    expect(asked).toHaveLength(1)
  })

  it('begins anew with another question, and drops rows of the earlier one that arrive late', async () => {
    const { list, asked, q } = await start([{ path: '/a/first', answer: { items: [1], nextCursor: 'x' } }])
    void list.loadMore()
    q.value = 'b'
    await flushPromises()
    asked[1]?.resolve({ items: [7], nextCursor: 'y' })
    await flushPromises()
    asked[0]?.resolve({ items: [2], nextCursor: null })
    await flushPromises()
    expect(list.items.value).toEqual([7])
    expect(list.nextCursor.value).toBe('y')
    expect(list.isLoadingMore.value).toBe(false)
  })

  it('keeps its rows when the next ones fail, and can try again', async () => {
    const { list, asked } = await start([{ path: '/a/first', answer: { items: [1], nextCursor: 'x' } }])
    void list.loadMore()
    asked[0]?.reject(new ApiError(503, 'unavailable', 'Later.'))
    await flushPromises()
    expect(list.items.value).toEqual([1])
    expect(list.moreError.value?.message).toBe('Later.')
    void list.loadMore()
    asked[1]?.resolve({ items: [2], nextCursor: null })
    await flushPromises()
    expect(list.items.value).toEqual([1, 2])
    expect(list.moreError.value).toBeNull()
  })

  it('opens as many pages again on the way back', async () => {
    window.history.replaceState({ openPages: 3 }, '')
    const { list } = await start([
      { path: '/a/first', answer: { items: [1], nextCursor: 'x' } },
      { path: '/a/x', answer: { items: [2], nextCursor: 'y' } },
      { path: '/a/y', answer: { items: [3], nextCursor: 'z' } },
    ])
    await flushPromises()
    expect(list.items.value).toEqual([1, 2, 3])
  })
})
