import { z } from 'zod'

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
