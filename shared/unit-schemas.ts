import { z } from 'zod'
import { TEMPERATURE_UNITS, UNITS } from './units.js'

export const unitSchema = z.enum(UNITS)
export const temperatureUnitSchema = z.enum(TEMPERATURE_UNITS)
