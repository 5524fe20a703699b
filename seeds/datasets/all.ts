import { amphitherm } from './amphitherm.js'
import type { DatasetDefinition } from './definition.js'
import { eu2007 } from './eu2007.js'
import { globtherm } from './globtherm.js'
import { intratherm } from './intratherm.js'
import { moore2023 } from './moore2023.js'
import { repttraits } from './repttraits.js'
import { squambase } from './squambase.js'

/**
 * Every dataset the importer knows, in the order of the first seed: full references come before the author-year keys that
 * may be resolved by them.
 */
export const datasets: readonly DatasetDefinition[] = [
  amphitherm,
  repttraits,
  eu2007,
  squambase,
  globtherm,
  moore2023,
  intratherm,
]
