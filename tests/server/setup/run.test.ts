import { spawn, type ChildProcess } from 'node:child_process'
import { once } from 'node:events'
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join, resolve } from 'node:path'
import { createInterface } from 'node:readline'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { takeLock } from '../../../server/setup/lock.mjs'
import { identify, isAlive, waitUntil, type ProcessIdentity } from '../../../server/setup/processes.mjs'

const setup = resolve(import.meta.dirname, '../../../server/setup')
let folder: string
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'run-'))
})
afterAll(() => rmSync(folder, { recursive: true }))

/** Starts a command whose body starts a long sleep and prints its number; gives both. */
async function startCommand(): Promise<{ command: ChildProcess; sleeper: ProcessIdentity }> {
  const script = join(folder, 'command.mjs')
  writeFileSync(
    script,
    `import { runCommand } from '${setup}/run.mjs'
    await runCommand(async (run) => {
      const { child, ended } = run.start('sleep', ['1000'])
      process.stdout.write(child.pid + '\\n')
      await ended
    }, { exitCodeOnSignal: 0 })`,
  )
  const command = spawn(process.execPath, [script], { stdio: ['ignore', 'pipe', 'inherit'] })
  const [line] = (await once(createInterface(command.stdout), 'line')) as [string]
  const sleeper = identify(Number(line))
  if (!sleeper) throw new Error('The sleep did not start.')
  return { command, sleeper }
}

describe('a command and what it started', () => {
  test.each(['SIGINT', 'SIGTERM', 'SIGHUP'] as const)('ends in order on %s', async (signal) => {
    const { command, sleeper } = await startCommand()
    command.kill(signal)
    expect((await once(command, 'exit'))[0]).toBe(0)
    expect(isAlive(sleeper)).toBe(false)
  })

  test('leaves nothing behind when it is killed', async () => {
    const { command, sleeper } = await startCommand()
    command.kill('SIGKILL')
    await once(command, 'exit')
    expect(await waitUntil(() => !isAlive(sleeper), 5_000)).toBe(true)
  })
})

describe('a lock', () => {
  test('is refused while another holds it, and free again after', async () => {
    const path = join(folder, 'lock')
    const first = await takeLock(path, 0)
    first?.note('here')
    expect(await takeLock(path, 0)).toBeUndefined()
    first?.release()
    const second = await takeLock(path, 0)
    expect(second).toBeDefined()
    second?.release()
  })

  test('dies with a holder that is killed, though its file stays', async () => {
    const path = join(folder, 'left')
    const script = join(folder, 'holder.mjs')
    writeFileSync(
      script,
      `import { takeLock } from '${setup}/lock.mjs'
      await takeLock('${path}', 0)
      process.stdout.write('held\\n')
      setInterval(() => {}, 1000)`,
    )
    const holder = spawn(process.execPath, [script], { stdio: ['ignore', 'pipe', 'inherit'] })
    await once(createInterface(holder.stdout), 'line')
    expect(await takeLock(path, 0)).toBeUndefined()
    holder.kill('SIGKILL')
    await once(holder, 'exit')
    const lock = await takeLock(path, 0)
    expect(lock).toBeDefined()
    lock?.release()
  })
})
