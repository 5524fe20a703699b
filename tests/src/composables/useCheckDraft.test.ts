import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { nextTick, type ShallowRef, shallowRef } from 'vue'
import { keepDraft, readDraft, useCheckDraft } from '../../../src/composables/useCheckDraft.js'
import { useChecker, type CheckTexts } from '../../../src/composables/useChecker.js'
import { makeContext, runComposable } from '../../helpers/page-context.js'
import { makeSpeciesPage } from '../../helpers/species-page.js'

const page = makeSpeciesPage()
const { slug } = page.species
const NOTHING: CheckTexts = { rows: [], room: { text: '', unit: 'degC' } }

async function open(address: ShallowRef<string | null>) {
  const { result, wrapper } = await runComposable(() => {
    const checker = useChecker({
      page: () => page,
      input: null,
      asked: { lifeStage: 'adult', season: 'active' },
      temperatureUnit: () => 'degC',
    })
    const draft = useCheckDraft(
      () => slug,
      checker,
      () => ({ address: address.value, own: 'own' }),
    )
    return { checker, draft }
  }, makeContext().context)
  return { ...result, wrapper }
}

type Opened = Awaited<ReturnType<typeof open>>

async function typeFirst({ checker }: Opened, text: string) {
  const [row] = checker.rows.value
  checker.put({ ...row!, form: { ...row!.form, values: [text] } })
  await nextTick()
}

beforeEach(() => {
  localStorage.clear()
  vi.useFakeTimers()
})
afterEach(() => vi.useRealTimers())

describe('a draft of a check', () => {
  it('comes back after a reload, the unfinished text included', async () => {
    const first = await open(shallowRef(null))
    await typeFirst(first, '4x')
    vi.runAllTimers()
    first.wrapper.unmount()
    const second = await open(shallowRef(null))
    expect(second.checker.rows.value[0]?.form.values).toEqual(['4x'])
    expect(second.draft.waiting.value).toBeNull()
  })

  it('is kept at once when the page is left', async () => {
    const opened = await open(shallowRef(null))
    await typeFirst(opened, '41')
    window.dispatchEvent(new Event('pagehide'))
    expect(readDraft(localStorage, slug)?.texts.rows[0]?.form.values).toEqual(['41'])
  })

  it('waits behind a link to another check, and comes back when it is asked for', async () => {
    const first = await open(shallowRef(null))
    await typeFirst(first, '41')
    first.wrapper.unmount()
    const second = await open(shallowRef('a check of somebody else'))
    expect(second.checker.hasTexts.value).toBe(false)
    second.draft.waiting.value?.()
    expect(second.checker.rows.value[0]?.form.values).toEqual(['41'])
    expect(second.draft.waiting.value).toBeNull()
  })

  it('belongs to the address it wrote', async () => {
    const first = await open(shallowRef(null))
    await typeFirst(first, '41')
    first.wrapper.unmount()
    const second = await open(shallowRef('own'))
    expect(second.checker.rows.value[0]?.form.values).toEqual(['41'])
  })

  it('is forgotten when the form is emptied', async () => {
    const opened = await open(shallowRef(null))
    await typeFirst(opened, '41')
    vi.runAllTimers()
    opened.checker.clear()
    await nextTick()
    vi.runAllTimers()
    expect(readDraft(localStorage, slug)).toBeNull()
  })

  it.each([
    ['no JSON', '{'],
    ['another version', JSON.stringify({ version: 99, links: [], texts: NOTHING })],
    ['rows of another shape', JSON.stringify({ version: 1, links: [], texts: { ...NOTHING, rows: [{}] } })],
    [
      'numbers for texts',
      JSON.stringify({
        version: 1,
        links: [],
        texts: { ...NOTHING, rows: [{ form: { values: [1] }, settled: [] }] },
      }),
    ],
  ])('is nothing where the storage holds %s', (_, text) => {
    expect(readDraft({ getItem: () => text }, slug)).toBeNull()
  })

  it('gives way where storage is forbidden', () => {
    const refuse = () => {
      throw new Error('forbidden')
    }
    const texts = { ...NOTHING, room: { text: '22', unit: 'degC' as const } }
    expect(() => keepDraft({ setItem: refuse, removeItem: refuse }, slug, texts, [])).not.toThrow()
    expect(readDraft({ getItem: refuse }, slug)).toBeNull()
  })
})
