import { readFileSync } from 'node:fs'
import { z } from 'zod'

const number = z.number()
const checkValueSchema = z.object({
  id: z.string(),
  section: z.string(),
  quantity: z.string(),
  inputs: z.record(z.string(), z.unknown()),
  expected: z.unknown(),
  source: z.string(),
  how_obtained: z.string(),
})
export type CheckValue = z.infer<typeof checkValueSchema>

const path = new URL('check-values.json', import.meta.url)
const values = z
  .object({ values: z.array(checkValueSchema) })
  .parse(JSON.parse(readFileSync(path, 'utf8'))).values

/** Check values whose id begins so; each carries its source and how the number was obtained. */
export function listCheckValues(idStart: string): CheckValue[] {
  const found = values.filter(({ id }) => id.startsWith(idStart))
  if (found.length === 0) throw new Error(`No check value begins with ${idStart}.`)
  return found
}

/** One check value. */
export function requireCheckValue(id: string): CheckValue {
  const found = values.find((value) => value.id === id)
  if (found === undefined) throw new Error(`There is no check value ${id}.`)
  return found
}

/** A number among a check value's inputs. */
export function inputOf(value: CheckValue, name: string): number {
  return number.parse(value.inputs[name])
}

/** The expected number. */
export function expectedOf(value: CheckValue): number {
  return number.parse(value.expected)
}

/** The two ends of an expected span. */
export function expectedSpanOf(value: CheckValue): { low: number; high: number } {
  const [low, high] = z.tuple([number, number]).parse(value.expected)
  return { low, high }
}
