import { flushPromises, type VueWrapper } from '@vue/test-utils'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import SearchBox from '../../../../src/components/search/SearchBox.vue'
import { makeContext, mountPage } from '../../../helpers/page-context.js'

const found = {
  items: [
    {
      slug: 'boa-one',
      scientificName: 'Boa one',
      commonNames: ['First boa'],
      matchedName: null,
      isInvented: true,
    },
    {
      slug: 'boa-two',
      scientificName: 'Boa two',
      commonNames: [],
      matchedName: 'Second boa',
      isInvented: true,
    },
  ],
  total: 9,
  nearest: [],
}

let open: VueWrapper | undefined
beforeEach(() => void vi.useFakeTimers())
afterEach(() => {
  open?.unmount()
  open = undefined
  vi.useRealTimers()
})

async function start() {
  const { context, asked } = makeContext()
  const { wrapper, router } = await mountPage(SearchBox, context, { id: 'find' })
  open = wrapper
  const input = wrapper.get<HTMLInputElement>('[role=combobox]')
  async function type(words: string, answer: unknown = found) {
    await input.setValue(words)
    vi.advanceTimersByTime(400)
    asked.at(-1)?.resolve(answer)
    await flushPromises()
  }
  return { wrapper, router, input, asked, type }
}

const activeText = (wrapper: VueWrapper) => {
  const id = wrapper.get('[role=combobox]').attributes('aria-activedescendant')
  return id === undefined ? null : wrapper.get(`#${id}`).text()
}

describe('the search field', () => {
  it('asks once typing rests, and not for a single letter', async () => {
    const { input, asked } = await start()
    await input.setValue('b')
    vi.advanceTimersByTime(1000)
    await input.setValue('bo')
    vi.advanceTimersByTime(100)
    await input.setValue('boa')
    vi.advanceTimersByTime(1000)
    expect(asked.map((read) => read.path)).toEqual(['/species?q=boa&limit=7'])
  })

  it('is closed at first and names its list once it opens', async () => {
    const { wrapper, input, type } = await start()
    expect(input.attributes('aria-expanded')).toBe('false')
    await type('boa')
    expect(input.attributes('aria-expanded')).toBe('true')
    expect(wrapper.get(`#${input.attributes('aria-controls')}`).attributes('role')).toBe('listbox')
    expect(wrapper.get('[role=status]').text()).toBe('9 names fit.')
    expect(wrapper.get('#find-option-1').text()).toContain('Second boa')
  })

  it('walks through the names and the field by arrow keys', async () => {
    const { wrapper, input, type } = await start()
    await type('boa')
    await input.trigger('keydown', { key: 'ArrowDown' })
    expect(activeText(wrapper)).toContain('Boa one')
    await input.trigger('keydown', { key: 'ArrowUp' })
    expect(activeText(wrapper)).toBeNull()
    await input.trigger('keydown', { key: 'ArrowUp' })
    expect(activeText(wrapper)).toBe('Show all 9 results')
  })

  it('opens the name the keys stand on, or the list of all for the words alone', async () => {
    const { wrapper, router, input, type } = await start()
    const push = vi.spyOn(router, 'push').mockResolvedValue(undefined)
    await type('boa')
    await input.trigger('keydown', { key: 'ArrowDown' })
    await wrapper.get('form').trigger('submit')
    await type('boa constrictor')
    await wrapper.get('form').trigger('submit')
    expect(push.mock.calls.map(([to]) => to)).toEqual(['/species/boa-one', '/species?q=boa+constrictor'])
  })

  it('closes at the first Escape and is emptied by the second', async () => {
    const { input, type } = await start()
    await type('boa')
    await input.trigger('keydown', { key: 'Escape' })
    expect(input.attributes('aria-expanded')).toBe('false')
    expect(input.element.value).toBe('boa')
    await input.trigger('keydown', { key: 'Escape' })
    expect(input.element.value).toBe('')
  })

  it('shows names near in spelling where nothing fits', async () => {
    const { wrapper, type } = await start()
    await type('bao', {
      items: [],
      total: 0,
      nearest: [{ slug: 'boa-one', scientificName: 'Boa one', name: 'Boa one' }],
    })
    expect(wrapper.findAll('[role=option]').map((option) => option.text())).toEqual([
      'Boa onenear in spelling',
    ])
    expect(wrapper.get('[role=status]').text()).toBe('No name fits.')
  })

  it('takes the focus at "/" unless something is being typed', async () => {
    const { input } = await start()
    const other = document.body.appendChild(document.createElement('input'))
    other.focus()
    other.dispatchEvent(new KeyboardEvent('keydown', { key: '/', bubbles: true, cancelable: true }))
    expect(document.activeElement).toBe(other)
    other.remove()
    document.body.dispatchEvent(new KeyboardEvent('keydown', { key: '/', bubbles: true, cancelable: true }))
    expect(document.activeElement).toBe(input.element)
  })
})
