import { z } from 'zod'
import { ABSOLUTE_ZERO_C } from './physical-bounds.js'

/** Surfaces whose emissivity the materials table knows. */
export const surfaceMaterialSchema = z.enum([
  'sand',
  'soil',
  'timber',
  'brick',
  'concrete',
  'marble',
  'slate',
  'ceramic',
  'glass',
  'plastic',
  'black-rubber',
  'paper',
  'water',
])
export type SurfaceMaterial = z.infer<typeof surfaceMaterialSchema>

/** Thermal emissivity of a material for instruments of 8 to 14 µm: the span over tables, and the value a form starts from. */
export interface MaterialEmissivity {
  label: string
  low: number
  high: number
  middle: number
  source: string
}

const TWO_HANDBOOKS = 'emissivity tables of at least two instrument handbooks that agree'
const ONE_HANDBOOK = 'emissivity table of one instrument handbook'

function material(label: string, low: number, high: number, source: string): MaterialEmissivity {
  return { label, low, high, middle: Math.round((low + high) * 50) / 100, source }
}

/** The materials table. Tables differ by up to 0.1; polished metal is left out, because it reads the room. */
export const MATERIALS: Readonly<Record<SurfaceMaterial, MaterialEmissivity>> = {
  sand: material('Sand', 0.9, 0.9, `${TWO_HANDBOOKS}; a third has 0.76`),
  soil: material('Soil', 0.92, 0.96, TWO_HANDBOOKS),
  timber: material('Planed timber', 0.9, 0.9, TWO_HANDBOOKS),
  brick: material('Brick', 0.93, 0.96, TWO_HANDBOOKS),
  concrete: material('Concrete', 0.94, 0.94, TWO_HANDBOOKS),
  marble: material('Marble', 0.94, 0.94, TWO_HANDBOOKS),
  slate: material('Slate', 0.97, 0.97, ONE_HANDBOOK),
  ceramic: material('Ceramic', 0.9, 0.94, TWO_HANDBOOKS),
  glass: material('Glass', 0.9, 0.95, TWO_HANDBOOKS),
  plastic: material('Plastic', 0.85, 0.95, TWO_HANDBOOKS),
  'black-rubber': material('Black rubber', 0.94, 0.94, TWO_HANDBOOKS),
  paper: material('Paper', 0.7, 0.94, TWO_HANDBOOKS),
  water: material('Water', 0.92, 0.96, TWO_HANDBOOKS),
}

/** An infrared reading and what it was taken of; temperatures in °C, emissivities above 0 up to 1. */
export interface InfraredReading {
  readC: number
  emissivitySet: number
  emissivity: number
  surroundingsC: number
}

/** A surface's temperature and how it answers to the reading and to the emissivity (partial derivatives). */
export interface SurfaceTemperature {
  surfaceC: number
  perReading: number
  /** °C for an emissivity greater by one. */
  perEmissivityC: number
}

function fourthPower(temperatureC: number): number {
  return (temperatureC - ABSOLUTE_ZERO_C) ** 4
}

/**
 * The true temperature T of a surface from an infrared reading, by the balance
 * ε_set·T_read⁴ + (1 − ε_set)·T_r⁴ = ε·T⁴ + (1 − ε)·T_r⁴ in kelvin. This is the total-radiation (Stefan-Boltzmann)
 * approximation; the instrument sees a band of it, which costs about 0.2 °C. Null when no temperature balances.
 */
export function correctForEmissivity(infrared: InfraredReading): SurfaceTemperature | null {
  const { readC, emissivitySet, emissivity, surroundingsC } = infrared
  const surroundings = fourthPower(surroundingsC)
  const fourth =
    (emissivitySet * fourthPower(readC) + (emissivity - emissivitySet) * surroundings) / emissivity
  if (!(fourth > 0)) return null
  const kelvin = Math.sqrt(Math.sqrt(fourth))
  const readKelvin = readC - ABSOLUTE_ZERO_C
  return {
    surfaceC: kelvin + ABSOLUTE_ZERO_C,
    perReading: (emissivitySet / emissivity) * (readKelvin / kelvin) ** 3,
    perEmissivityC: (surroundings - fourth) / (4 * emissivity * kelvin ** 3),
  }
}

/** What an infrared thermometer shows of a surface of known temperature: the inverse of the correction, °C. Null as above. */
export function readSurface(surface: Omit<InfraredReading, 'readC'> & { surfaceC: number }): number | null {
  const swapped = correctForEmissivity({
    readC: surface.surfaceC,
    emissivitySet: surface.emissivity,
    emissivity: surface.emissivitySet,
    surroundingsC: surface.surroundingsC,
  })
  return swapped?.surfaceC ?? null
}
