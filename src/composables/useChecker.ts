import { computed, ref, watch, type ComputedRef, type Ref } from 'vue'
import {
  READINGS_MAX,
  type CheckInput,
  type CheckResult,
  type Question,
  type ReadingVerdict,
} from '../../shared/checker/check.js'
import { checkReadings } from '../../shared/checker/check-readings.js'
import { parseNumber } from '../../shared/checker/parse-number.js'
import { parseReading, type FieldError, type ParsedReading } from '../../shared/checker/parse-reading.js'
import { findImpossibility } from '../../shared/checker/physical-bounds.js'
import type { Reading } from '../../shared/checker/reading.js'
import type { ReadingForm } from '../../shared/checker/parse-reading.js'
import type { SpeciesPage } from '../../shared/species.js'
import type { TemperatureUnit } from '../../shared/units.js'
import {
  arrangeRows,
  isEmpty,
  makeForm,
  prepareForms,
  toForm,
  toRow,
  type AskedFor,
  type FormRow,
} from './check-rows.js'

/** A temperature of the room as typed. */
export interface RoomText {
  text: string
  unit: TemperatureUnit
}

/** A reading that can be judged, with its row and verdict. */
export interface JudgedRow {
  row: FormRow
  reading: Reading
  verdict: ReadingVerdict
}

/** A field that needs another look. `rowId` is null for the room's temperature. */
export interface RowError extends FieldError {
  rowId: string | null
}

/** What a form holds, to be kept and brought back. */
export interface CheckTexts {
  rows: { form: ReadingForm; settled: Question[] }[]
  room: RoomText
}

export interface Checker {
  asked: Ref<AskedFor>
  rows: Ref<FormRow[]>
  room: Ref<RoomText>
  roomError: ComputedRef<string | null>
  isRoomTouched: Ref<boolean>
  /** Whether anything is typed. */
  hasTexts: ComputedRef<boolean>
  isFull: ComputedRef<boolean>
  /** Every reading that can be judged, in the order of the rows; null when there is none. */
  input: ComputedRef<CheckInput | null>
  result: ComputedRef<CheckResult | null>
  judged: ComputedRef<JudgedRow[]>
  /** The answer for each row that was typed in. */
  parsed: ComputedRef<Map<string, ParsedReading>>
  verdicts: ComputedRef<Map<string, JudgedRow>>
  /** What to say is wrong: only of rows the person has left. */
  errors: ComputedRef<RowError[]>
  /** Adds a place, or a second gauge beside a row, and gives the id of the new row. */
  add(beside?: FormRow): string
  /** Puts a changed row in the place of the one with its id. */
  put(row: FormRow): void
  remove(id: string): void
  /** Empties the form; `undoClear` brings everything back once. */
  clear(): void
  undoClear: Ref<(() => void) | null>
  takeTexts(): CheckTexts
  putTexts(texts: CheckTexts): void
  /** Shows the readings of a link in place of what the form holds. */
  adopt(input: CheckInput | null, asked: AskedFor): void
}

/**
 * Holds a form of readings, as typed, against a species page. What can be judged is judged at every keystroke by the same
 * function that the API answers with.
 */
export function useChecker(start: {
  page: () => SpeciesPage
  input: CheckInput | null
  asked: AskedFor
  temperatureUnit: () => TemperatureUnit
}): Checker {
  let count = 0
  const makeId = () => `r${(count += 1)}`
  const asked = ref<AskedFor>({ ...start.asked })
  const rows = ref<FormRow[]>([])
  const room = ref<RoomText>({ text: '', unit: start.temperatureUnit() })
  const isRoomTouched = ref(false)
  const undoClear = ref<(() => void) | null>(null)
  /** The unit a person last chose goes with every row that is still empty: it is the same instrument. */
  const lastUnit = ref<TemperatureUnit | null>(null)
  const unit = computed(() => lastUnit.value ?? start.temperatureUnit())

  function arrange(from: readonly FormRow[]): void {
    const prepared = prepareForms(start.page().ranges, asked.value, unit.value)
    rows.value = arrangeRows(from, prepared, makeId)
  }

  function fill(forms: readonly { form: ReadingForm; settled: Question[] }[]): void {
    arrange(forms.map(({ form, settled }) => ({ ...toRow(form, makeId(), false), isTouched: true, settled })))
  }

  function adopt(input: CheckInput | null, from: AskedFor): void {
    asked.value = { ...from }
    fill((input?.readings ?? []).map((reading) => ({ form: toForm(reading), settled: [] })))
    const roomTemperature = input?.roomTemperature ?? null
    room.value = {
      text: roomTemperature === null ? '' : String(roomTemperature.value),
      unit: roomTemperature?.unit ?? unit.value,
    }
    undoClear.value = null
  }

  const filled = computed(() => rows.value.filter((row) => !isEmpty(row)))
  const parsed = computed(() => new Map(filled.value.map((row) => [row.id, parseReading(row.form)])))
  const parsedRoom = computed(() => {
    const { text, unit: roomUnit } = room.value
    const number = parseNumber(text)
    if (number.form === 'missing') return { value: null, error: null }
    if (number.form === 'not-a-number') {
      return { value: null, error: 'This is not a number. Write it like 21.5 or 21,5, without unit.' }
    }
    const error = findImpossibility('temperature', number.value, roomUnit)
    return { value: error === null ? { value: number.value, unit: roomUnit } : null, error }
  })

  const judgeable = computed(() =>
    filled.value
      .flatMap((row) => {
        const answer = parsed.value.get(row.id)
        return answer?.ok === true ? [{ row, reading: answer.reading }] : []
      })
      .slice(0, READINGS_MAX),
  )
  const input = computed<CheckInput | null>(() => {
    if (judgeable.value.length === 0) return null
    const { species, revision } = start.page()
    return {
      slug: species.slug,
      revision: revision.number,
      ...asked.value,
      roomTemperature: parsedRoom.value.value,
      readings: judgeable.value.map(({ reading }) => reading),
    }
  })
  const result = computed(() => (input.value === null ? null : checkReadings(start.page(), input.value)))
  const judged = computed(() =>
    judgeable.value.flatMap(({ row, reading }, index) => {
      const verdict = result.value?.verdicts[index]
      return verdict === undefined ? [] : [{ row, reading, verdict }]
    }),
  )
  const verdicts = computed(() => new Map(judged.value.map((entry) => [entry.row.id, entry])))

  const errors = computed<RowError[]>(() => {
    const found = filled.value.flatMap((row): RowError[] => {
      const answer = parsed.value.get(row.id)
      if (!row.isTouched || answer === undefined || answer.ok) return []
      return answer.errors.map((error) => ({ ...error, rowId: row.id }))
    })
    const { error } = parsedRoom.value
    if (error !== null && isRoomTouched.value) found.push({ rowId: null, path: 'room', message: error })
    return found
  })

  adopt(start.input, start.asked)

  watch([() => start.page().ranges, () => asked.value.lifeStage, () => asked.value.season], () =>
    arrange(rows.value),
  )
  watch(unit, (chosen) => {
    for (const row of rows.value) {
      if (isEmpty(row) && row.form.parameter === 'temperature') row.form.unit = chosen
    }
    if (room.value.text.trim() === '') room.value.unit = chosen
  })
  watch(
    () => rows.value.map(({ form }) => (form.parameter === 'temperature' ? form.unit : null)),
    (now, before) => {
      if (now.length !== before.length) return
      const changed = now.find((chosen, index) => chosen !== null && chosen !== before[index])
      if (changed === 'degC' || changed === 'degF') lastUnit.value = changed
    },
  )
  // A switch of the whole page's unit is newer than a choice in one row.
  watch(start.temperatureUnit, () => {
    lastUnit.value = null
  })

  return {
    asked,
    rows,
    room,
    roomError: computed(() => (isRoomTouched.value ? parsedRoom.value.error : null)),
    isRoomTouched,
    hasTexts: computed(() => filled.value.length > 0 || room.value.text.trim() !== ''),
    isFull: computed(() => filled.value.length >= READINGS_MAX),
    input,
    result,
    judged,
    parsed,
    verdicts,
    errors,
    add(beside) {
      const form =
        beside === undefined
          ? {
              ...makeForm(
                { parameter: 'temperature', position: 'warm-end-air', period: 'day', uvMeaning: null },
                unit.value,
              ),
              position: '',
            }
          : { ...beside.form, values: [''], surface: null }
      const row = toRow(form, makeId(), false)
      rows.value.push(row)
      return row.id
    },
    put(row) {
      rows.value = rows.value.map((other) => (other.id === row.id ? row : other))
    },
    remove(id) {
      rows.value = rows.value.filter((row) => row.id !== id)
    },
    clear() {
      const before = { rows: rows.value, room: room.value }
      arrange([])
      room.value = { text: '', unit: unit.value }
      undoClear.value = () => {
        arrange(before.rows)
        room.value = before.room
        undoClear.value = null
      }
    },
    undoClear,
    takeTexts() {
      const texts = filled.value.map(({ form, settled }) => ({ form, settled }))
      return { rows: texts, room: room.value }
    },
    putTexts(texts) {
      room.value = { ...texts.room }
      fill(texts.rows)
    },
    adopt,
  }
}
