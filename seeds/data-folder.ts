import { existsSync } from 'node:fs'
import { join } from 'node:path'

/** The folder of the open data. The built program stands in another folder than its source, the data in one alone. */
export function findDataFolder(): string {
  const beside = join(import.meta.dirname, 'data')
  return existsSync(beside) ? beside : join(import.meta.dirname, '..', '..', 'seeds', 'data')
}
