import { join } from 'node:path'
import { withLock } from '../lock.mjs'
import { setUp } from '../installation.mjs'
import { root, stateFolder } from '../places.mjs'
import { buildProduct } from '../product.mjs'
import { runCommand } from '../run.mjs'

await runCommand(async (run) => {
  await setUp(run, { build: false })
  await withLock(join(stateFolder(), 'setup.lock'), () => buildProduct(run, root))
})
