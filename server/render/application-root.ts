import { existsSync } from 'node:fs'
import { dirname, join } from 'node:path'

/** The folder that holds package.json, whether this file runs as it is or from the build. */
export function findApplicationRoot(from: string = import.meta.dirname): string {
  let folder = from
  while (!existsSync(join(folder, 'package.json'))) {
    const parent = dirname(folder)
    if (parent === folder) throw new Error(`There is no package.json above ${from}.`)
    folder = parent
  }
  return folder
}
