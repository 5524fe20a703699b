import { z } from 'zod'

/** Kinds of instrument a reading may come from. */
export const instrumentKindSchema = z.enum([
  'probe-thermometer',
  'infrared-thermometer',
  'dial-thermometer',
  'glass-thermometer',
  'capacitive-hygrometer',
  'dial-hygrometer',
  'uv-index-meter',
  'timer',
])
export type InstrumentKind = z.infer<typeof instrumentKindSchema>
