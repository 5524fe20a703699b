/** Pages of the small seed that the journeys visit. */
export const BASKER = { slug: 'apricator-salinarum', name: 'Apricator salinarum' }
/** A real page of physiology alone. */
export const FENCE_LIZARD = { slug: 'sceloporus-occidentalis', name: 'Sceloporus occidentalis' }
