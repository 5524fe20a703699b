import { flushPromises, type VueWrapper } from '@vue/test-utils'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { decodeCheck, encodeCheck } from '../../../../shared/checker/check-link.js'
import type { CheckInput } from '../../../../shared/checker/check.js'
import SpeciesCheckView from '../../../../src/views/SpeciesCheckView.vue'
import type { StoredRead } from '../../../../src/composables/page-context.js'
import type { SpeciesPage } from '../../../../shared/species.js'
import { makeReading } from '../../../helpers/check-page.js'
import { makeContext, mountPage } from '../../../helpers/page-context.js'
import { makeMark, makeRange, makeSpeciesPage } from '../../../helpers/species-page.js'

const page = makeSpeciesPage()
const { slug } = page.species
const PATH = `/species/${slug}/check`

const basking = makeReading({
  position: 'basking-surface',
  values: [49],
  instrument: 'infrared-thermometer',
})

function write(readings: CheckInput['readings'], part: Partial<CheckInput> = {}): string {
  return encodeCheck({
    revision: 2,
    season: 'active',
    lifeStage: 'adult',
    roomTemperature: null,
    readings,
    ...part,
  })
}

async function open(address: string, reads: StoredRead[]) {
  const { context } = makeContext(reads)
  const opened = await mountPage(SpeciesCheckView, context, {}, address)
  await flushPromises()
  return opened
}

const answer = (path: string, of: SpeciesPage): StoredRead => ({ path, answer: of })

async function type(wrapper: VueWrapper, label: string, text: string): Promise<void> {
  const found = wrapper.findAll('label').find((element) => element.text() === label)
  if (found === undefined) throw new Error(`There is no field ${label}.`)
  const field = wrapper.find(`#${found.attributes('for') ?? ''}`)
  await field.setValue(text)
  await field.trigger('blur')
}

beforeEach(() => {
  localStorage.clear()
  vi.useFakeTimers({ toFake: ['setTimeout', 'clearTimeout'] })
})
afterEach(() => vi.useRealTimers())

describe('a check in the browser', () => {
  it('gives the verdict as a number is typed, and names it in the address with the revision', async () => {
    const { wrapper, router } = await open(PATH, [answer(`/species/${slug}`, page)])
    await type(wrapper, 'Basking surface, lights on: what it reads', '49')
    expect(wrapper.find('.filled').text()).toContain('High')
    vi.runAllTimers()
    await flushPromises()
    const decoded = decodeCheck(slug, String(router.currentRoute.value.query.c))
    expect(decoded).toMatchObject({ ok: true, input: { revision: 2, readings: [{ values: [49] }] } })
    wrapper.unmount()
  })

  it('shows a link’s readings, question and room', async () => {
    const c = write([basking], { lifeStage: 'juvenile', roomTemperature: { value: 71, unit: 'degF' } })
    const { wrapper } = await open(`${PATH}?c=${c}`, [answer(`/species/${slug}?revision=2`, page)])
    expect((wrapper.find('#check-stage').element as HTMLSelectElement).value).toBe('juvenile')
    expect((wrapper.find('#check-room').element as HTMLInputElement).value).toBe('71')
    expect(wrapper.find('.filled').text()).toContain('Near a limit')
    wrapper.unmount()
  })

  it('takes the switches of the species page along', async () => {
    const { wrapper } = await open(`${PATH}?stage=juvenile`, [answer(`/species/${slug}`, page)])
    expect((wrapper.find('#check-stage').element as HTMLSelectElement).value).toBe('juvenile')
    wrapper.unmount()
  })

  it('asks back about degrees, and takes the answer from a button', async () => {
    const { wrapper } = await open(PATH, [answer(`/species/${slug}`, page)])
    await type(wrapper, 'Cool-end air, lights on: what it reads', '75')
    expect(wrapper.text()).toContain('Did you mean 75 °F?')
    await wrapper
      .findAll('button')
      .find((button) => button.text() === 'Yes, °F')!
      .trigger('click')
    expect(wrapper.text()).not.toContain('Did you mean')
    expect(wrapper.find('.filled .verdict').text()).toContain('Inside')
    wrapper.unmount()
  })

  it('sums what is wrong up above the form with the way to the field', async () => {
    const { wrapper } = await open(PATH, [answer(`/species/${slug}`, page)])
    await type(wrapper, 'Basking air, UV index, typical exposure, lights on: what it reads', 'zone 3')
    const way = wrapper.find('.errors a')
    expect(wrapper.find(way.attributes('href')!).attributes('aria-invalid')).toBe('true')
    expect(wrapper.find('.errors').text()).toContain('A zone is a class of animals')
    wrapper.unmount()
  })

  it('says what a newer revision would answer otherwise, and leads to it', async () => {
    const older = makeSpeciesPage({
      revision: makeMark(1),
      ranges: [makeRange({ low: 46, high: 52, upperLimit: 58 }, [])],
    })
    const c = write([basking], { revision: 1 })
    const { wrapper } = await open(`${PATH}?c=${c}`, [
      answer(`/species/${slug}?revision=1`, older),
      answer(`/species/${slug}`, page),
    ])
    const note = wrapper.find('.older').text().replaceAll('\u00a0', ' ')
    expect(note).toContain('Held against revision 1')
    expect(note).toContain('Revision 2 would answer otherwise for 1 reading')
    expect(note).toMatch(/here\s+Inside\s*, there\s+High/)
    const decoded = decodeCheck(slug, wrapper.find('.older a').attributes('href')!.split('c=')[1]!)
    expect(decoded).toMatchObject({ ok: true, input: { revision: 2 } })
    wrapper.unmount()
  })

  it.each([
    ['1_2_aa_*tbd', 'This link cannot be read'],
    ['2_anything', 'made by a newer version'],
  ])('says plainly that the link %s leads nowhere, above an empty form', async (c, words) => {
    const { wrapper } = await open(`${PATH}?c=${c}`, [answer(`/species/${slug}`, page)])
    expect(wrapper.find('[role=alert]').text()).toContain(words)
    expect(wrapper.findAll('.filled')).toHaveLength(0)
    expect(wrapper.findAll('.reading').length).toBeGreaterThan(0)
    wrapper.unmount()
  })

  it('offers the current revision where a link names one that does not exist', async () => {
    const c = write([basking], { revision: 9 })
    const missing = { status: 404, code: 'not-found', message: 'There is no such revision.' }
    const { wrapper } = await open(`${PATH}?c=${c}`, [
      { path: `/species/${slug}?revision=9`, error: missing },
    ])
    const address = wrapper.find('a.button').attributes('href')!
    expect(decodeCheck(slug, address.split('c=')[1]!)).toMatchObject({ ok: true, input: { revision: null } })
    wrapper.unmount()
  })
})
