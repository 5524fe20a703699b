import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { checkInputSchema } from '../../../shared/checker/check.js'
import type { CheckInput } from '../../../shared/checker/check.js'
import { CHECK_LINK_LENGTH_MAX, decodeCheck, encodeCheck } from '../../../shared/checker/check-link.js'
import { surfaceMaterialSchema } from '../../../shared/checker/emissivity.js'
import { INSTRUMENTS, canRead, instrumentKindSchema } from '../../../shared/checker/instruments.js'
import { UNITS_OF_PARAMETER } from '../../../shared/checker/reading.js'
import type { Reading } from '../../../shared/checker/reading.js'
import { lifeStageSchema, parameterSchema, positionSchema, seasonSchema } from '../../../shared/ranges.js'
import { makeCheckInput, makeReading } from '../../helpers/check-page.js'

const double = (min: number, max: number) =>
  fc.double({ min, max, noNaN: true }).map((value) => (value === 0 ? 0 : value))
const positive = (max: number) => fc.double({ min: 1e-9, max, noNaN: true })
const option = <T>(arbitrary: fc.Arbitrary<T>) => fc.option(arbitrary, { nil: null })

const accuracy = fc
  .record({
    form: fc.constantFrom('limit' as const, 'expanded' as const),
    absolute: option(positive(1000)),
    relativePercent: option(positive(100)),
    combine: fc.constantFrom('larger' as const, 'sum' as const),
  })
  .filter(({ absolute, relativePercent }) => absolute !== null || relativePercent !== null)

const reading: fc.Arbitrary<Reading> = fc
  .record({
    parameter: fc.constantFrom(...parameterSchema.options),
    position: fc.constantFrom(...positionSchema.options),
    period: fc.constantFrom('day' as const, 'night' as const),
    values: fc.array(double(0, 24), { minLength: 1, maxLength: 20 }),
    accuracy: option(accuracy),
    resolution: option(positive(100)),
    uvMeaning: fc.constantFrom('typical' as const, 'maximum' as const),
    surface: option(
      fc.record({
        material: option(fc.constantFrom(...surfaceMaterialSchema.options)),
        emissivity: double(0.5, 1),
        emissivitySet: double(0.5, 1),
        surroundings: double(0, 40),
      }),
    ),
  })
  .chain((part) =>
    fc
      .record({
        unit: fc.constantFrom(...UNITS_OF_PARAMETER[part.parameter]),
        instrument: fc.constantFrom(
          ...instrumentKindSchema.options.filter((kind) => canRead(kind, part.parameter)),
        ),
      })
      .map(({ unit, instrument }) => ({
        ...part,
        unit,
        instrument,
        uvMeaning: part.parameter === 'uv-index' ? part.uvMeaning : null,
        surface: instrument === 'infrared-thermometer' ? part.surface : null,
      })),
  )

const check: fc.Arbitrary<CheckInput> = fc.record({
  slug: fc.constant('invented-lizard'),
  revision: option(fc.integer({ min: 1, max: 1_000_000 })),
  season: fc.constantFrom(...seasonSchema.exclude(['any']).options),
  lifeStage: fc.constantFrom(...lifeStageSchema.exclude(['any']).options),
  roomTemperature: option(
    fc.record({ value: double(-50, 150), unit: fc.constantFrom('degC' as const, 'degF' as const) }),
  ),
  readings: fc.array(reading, { minLength: 1, maxLength: 40 }),
})

describe('a check link', () => {
  it('brings every check back exactly', () => {
    fc.assert(
      fc.property(check, (input) => {
        fc.pre(checkInputSchema.safeParse(input).success)
        expect(decodeCheck(input.slug, encodeCheck(input))).toEqual({ ok: true, input })
      }),
    )
  })

  it('needs no escaping in an address, in whatever way it is written', () => {
    fc.assert(
      fc.property(check, (input) => {
        const text = encodeCheck(input)
        expect(new URLSearchParams({ c: text }).toString()).toBe(`c=${text}`)
      }),
    )
  })

  it('stays short for forty readings with an accuracy and three repeats each', () => {
    const stated = { form: 'limit', absolute: 0.5, relativePercent: 2, combine: 'larger' } as const
    const readings = Array.from({ length: 40 }, () =>
      makeReading({ values: [31.5, 31.7, 32.1], accuracy: stated, resolution: 0.1 }),
    )
    expect(encodeCheck(makeCheckInput(readings)).length).toBeLessThan(1600)
  })

  it('written once is read for ever', () => {
    expect(decodeCheck('x', '1_3_aj_f73*tbdfi112x110_all2x2_d0.1_ss0.9x0.95x77*uaduu3.1_mt')).toEqual({
      ok: true,
      input: {
        slug: 'x',
        revision: 3,
        season: 'active',
        lifeStage: 'juvenile',
        roomTemperature: { unit: 'degF', value: 73 },
        readings: [
          makeReading({
            position: 'basking-surface',
            unit: 'degF',
            instrument: 'infrared-thermometer',
            values: [112, 110],
            accuracy: { form: 'limit', combine: 'larger', absolute: 2, relativePercent: 2 },
            resolution: 0.1,
            surface: { material: 'sand', emissivity: 0.9, emissivitySet: 0.95, surroundings: 77 },
          }),
          makeReading({
            parameter: 'uv-index',
            position: 'basking-air',
            unit: 'uvi',
            instrument: 'uv-index-meter',
            values: [3.1],
            uvMeaning: 'typical',
          }),
        ],
      },
    })
  })

  it.each([
    ['nothing', ''],
    ['another version', '2__aa_*twdcp30'],
    ['no readings', '1__aa_'],
    ['an empty value, which is missing and not zero', '1__aa_*twdcp'],
    ['an empty repeat', '1__aa_*twdcp30x'],
    ['an unknown letter', '1__aa_*qwdcp30'],
    ['a name of every object in place of a letter', '1__aa_*constructor30'],
    ['an option from nowhere', '1__aa_*twdcp30_z1'],
    ['a number cut short', '1__aa_*twdcp30._d'],
    ['a humidity that cannot be', '1__aa_*hwdrc120'],
    ['a revision of zero', '1_0_aa_*twdcp30'],
    ['more than forty readings', `1__aa_${'*twdcp30'.repeat(41)}`],
    ['a text without end', '1'.repeat(CHECK_LINK_LENGTH_MAX + 1)],
  ])('of %s is refused with a sentence', (_, text) => {
    const decoded = decodeCheck('invented-lizard', text)
    expect(decoded.ok).toBe(false)
    expect(decoded.ok ? [] : decoded.errors[0]?.message).toMatch(/^[A-Z].*\.$/)
  })

  it('never throws, whatever it is given', () => {
    const alphabet = fc.constantFrom(...'1_*x.-eabcdtuwhpz09')
    const text = fc.oneof(fc.string(), fc.string({ unit: alphabet, maxLength: 80 }))
    fc.assert(
      fc.property(text, (given) => {
        const decoded = decodeCheck('invented-lizard', given)
        if (decoded.ok) expect(checkInputSchema.safeParse(decoded.input).success).toBe(true)
        else expect(decoded.errors.length).toBeGreaterThan(0)
      }),
    )
  })

  it('has a letter for everything that can be chosen', () => {
    for (const [kind, { parameters }] of Object.entries(INSTRUMENTS)) {
      const parameter = parameters[0]
      const made = makeReading({
        parameter,
        instrument: instrumentKindSchema.parse(kind),
        unit: UNITS_OF_PARAMETER[parameter][0],
        values: [1],
        uvMeaning: parameter === 'uv-index' ? 'maximum' : null,
      })
      for (const position of positionSchema.options) {
        const input = makeCheckInput([{ ...made, position }])
        expect(decodeCheck(input.slug, encodeCheck(input))).toEqual({ ok: true, input })
      }
    }
  })
})
