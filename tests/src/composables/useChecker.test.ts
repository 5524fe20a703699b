import { describe, expect, it } from 'vitest'
import { effectScope, nextTick, ref, shallowRef } from 'vue'
import { checkReadings } from '../../../shared/checker/check-readings.js'
import type { SpeciesPage } from '../../../shared/species.js'
import type { TemperatureUnit } from '../../../shared/units.js'
import { useChecker, type Checker } from '../../../src/composables/useChecker.js'
import { makeSpeciesPage } from '../../helpers/species-page.js'

function startChecker() {
  const page = shallowRef<SpeciesPage>(makeSpeciesPage())
  const unit = ref<TemperatureUnit>('degC')
  const scope = effectScope()
  const checker = scope.run(() =>
    useChecker({
      page: () => page.value,
      input: null,
      asked: { lifeStage: 'adult', season: 'active' },
      temperatureUnit: () => unit.value,
    }),
  ) as Checker
  return { page, unit, checker }
}

function rowAt(checker: Checker, position: string, period = 'day') {
  return checker.rows.value.find((row) => row.form.position === position && row.form.period === period)!
}

function type(checker: Checker, position: string, text: string, isTouched = true) {
  const row = rowAt(checker, position)
  checker.put({ ...row, isTouched, form: { ...row.form, values: [text] } })
}

describe('a form of readings', () => {
  it('has nothing to judge while it is empty', () => {
    const { checker } = startChecker()
    expect(checker.input.value).toBeNull()
    expect(checker.result.value).toBeNull()
    expect(checker.hasTexts.value).toBe(false)
  })

  it('judges what is typed by the function the API answers with', () => {
    const { checker, page } = startChecker()
    type(checker, 'basking-surface', '49,5')
    type(checker, 'cool-end-air', '26')
    const input = checker.input.value!
    expect(input).toMatchObject({ slug: 'fabulacerta-cinnabarina', revision: 2, lifeStage: 'adult' })
    expect(input.readings.map(({ values }) => values)).toEqual([[49.5], [26]])
    expect(checker.result.value).toEqual(checkReadings(page.value, input))
    expect(checker.judged.value.map(({ verdict }) => verdict.standing)).toEqual(['high', 'unclear'])
  })

  it('judges every other reading while one cannot be read', () => {
    const { checker } = startChecker()
    type(checker, 'basking-surface', '43')
    type(checker, 'warm-end-air', 'warm')
    expect(checker.judged.value).toHaveLength(1)
    expect(checker.errors.value).toEqual([
      {
        rowId: rowAt(checker, 'warm-end-air').id,
        path: 'values.0',
        message: expect.stringContaining('not a number'),
      },
    ])
  })

  it('says nothing is wrong before a field is left', () => {
    const { checker } = startChecker()
    type(checker, 'warm-end-air', '-', false)
    expect(checker.errors.value).toEqual([])
    type(checker, 'warm-end-air', '-')
    expect(checker.errors.value).toHaveLength(1)
  })

  it('leaves out a room temperature that cannot be, and says so once the field is left', () => {
    const { checker } = startChecker()
    type(checker, 'basking-surface', '43')
    checker.room.value = { text: '-400', unit: 'degC' }
    expect(checker.input.value?.roomTemperature).toBeNull()
    expect(checker.roomError.value).toBeNull()
    checker.isRoomTouched.value = true
    expect(checker.roomError.value).toContain('absolute zero')
    expect(checker.errors.value).toMatchObject([{ rowId: null, path: 'room' }])
  })

  it('empties on demand, and brings everything back once', () => {
    const { checker } = startChecker()
    type(checker, 'basking-surface', '43')
    checker.room.value = { text: '22', unit: 'degC' }
    checker.clear()
    expect(checker.hasTexts.value).toBe(false)
    checker.undoClear.value?.()
    expect(rowAt(checker, 'basking-surface').form.values).toEqual(['43'])
    expect(checker.room.value.text).toBe('22')
    expect(checker.undoClear.value).toBeNull()
  })

  it('lets the unit chosen in one row go with the empty ones, and leaves a typed number alone', async () => {
    const { checker } = startChecker()
    type(checker, 'basking-surface', '43')
    const row = rowAt(checker, 'warm-end-air')
    checker.put({ ...row, form: { ...row.form, unit: 'degF' } })
    await nextTick()
    await nextTick()
    expect(rowAt(checker, 'basking-surface').form.unit).toBe('degC')
    expect(rowAt(checker, 'cool-hide').form.unit).toBe('degF')
  })

  it('holds the same readings against another life stage', async () => {
    const { checker } = startChecker()
    type(checker, 'basking-surface', '43')
    expect(checker.result.value?.summary.worst).toBe('inside')
    checker.asked.value = { lifeStage: 'juvenile', season: 'active' }
    await nextTick()
    expect(checker.result.value).toMatchObject({ lifeStage: 'juvenile', summary: { worst: 'unclear' } })
  })

  it('names the revision of the page it is held against', () => {
    const { checker, page } = startChecker()
    type(checker, 'basking-surface', '43')
    page.value = makeSpeciesPage({
      revision: { ...page.value.revision, number: 7 },
      currentRevisionNumber: 7,
    })
    expect(checker.input.value?.revision).toBe(7)
  })

  it('gives its texts and takes them back, the unfinished included', () => {
    const { checker } = startChecker()
    type(checker, 'basking-surface', '4x')
    const texts = structuredClone(JSON.parse(JSON.stringify(checker.takeTexts())))
    const other = startChecker().checker
    other.putTexts(texts)
    expect(rowAt(other, 'basking-surface').form.values).toEqual(['4x'])
  })

  it('adds a second gauge beside a row, without its number', () => {
    const { checker } = startChecker()
    type(checker, 'basking-surface', '43')
    const id = checker.add(rowAt(checker, 'basking-surface'))
    const added = checker.rows.value.find((row) => row.id === id)
    expect(added).toMatchObject({ isPrepared: false, form: { position: 'basking-surface', values: [''] } })
  })
})
