import { CLOUDWOOD_CLIMBER } from './cloudwood-climber.js'
import type { DemonstrationSpecies } from './content.js'
import { DOWN_TORTOISE } from './down-tortoise.js'
import { DRIPLEAF_FROG } from './dripleaf-frog.js'
import { HUSH_GECKO } from './hush-gecko.js'
import { MERE_TURTLE } from './mere-turtle.js'
import { RIMEBACK_SNAKE } from './rimeback-snake.js'
import { SALT_PAN_LIZARD } from './salt-pan-lizard.js'
import { TUNNEL_SPIDER } from './tunnel-spider.js'

/**
 * The eight invented species of the invented country of Sulenmark. They exist so that every feature can be tried at full
 * depth; no number here describes a living animal. Each page holds one deliberate flaw, listed in `flaws.ts`.
 */
export const DEMONSTRATION_SPECIES: readonly DemonstrationSpecies[] = [
  SALT_PAN_LIZARD,
  HUSH_GECKO,
  CLOUDWOOD_CLIMBER,
  RIMEBACK_SNAKE,
  DOWN_TORTOISE,
  MERE_TURTLE,
  DRIPLEAF_FROG,
  TUNNEL_SPIDER,
]
