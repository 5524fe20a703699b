import { z } from 'zod'

/**
 * Units a value may be typed or printed in. Names follow UCUM where it has one (Cel, [degF], %, h, cm, [in_i]),
 * written here as plain words. Canonical units: degC, percentRh, uvi, h, cm.
 */
export const unitSchema = z.enum(['degC', 'degF', 'percentRh', 'uvi', 'h', 'cm', 'in'])
export type Unit = z.infer<typeof unitSchema>

export const temperatureUnitSchema = z.enum(['degC', 'degF'])
export type TemperatureUnit = z.infer<typeof temperatureUnitSchema>

export const lengthUnitSchema = z.enum(['cm', 'in'])
export type LengthUnit = z.infer<typeof lengthUnitSchema>
