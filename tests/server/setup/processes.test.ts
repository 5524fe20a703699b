import { spawn } from 'node:child_process'
import { once } from 'node:events'
import { describe, expect, test } from 'vitest'
import { endProcess, identify, isAlive, parseStat } from '../../../server/setup/processes.mjs'

describe('knowing a process again', () => {
  test('reads a line of the system whatever the name of the program', () => {
    const line = '42 (odd ) name (S) 7) S 1 42 42 0 -1 4194560 1 0 0 0 0 0 0 0 20 0 1 0 987654 0 0'
    expect(parseStat(line)).toEqual({ state: 'S', parentPid: 1, startedAt: '987654' })
  })

  test('tells our own process from another that got the same number', () => {
    const own = identify(process.pid)
    expect(own && isAlive(own)).toBe(true)
    expect(isAlive({ pid: process.pid, startedAt: '1' })).toBe(false)
  })

  test('sees that a process has ended', async () => {
    const child = spawn('sleep', ['100'])
    await once(child, 'spawn')
    const identity = identify(child.pid ?? 0)
    expect(identity).toBeDefined()
    const ended = once(child, 'exit')
    if (identity) await endProcess(identity, ['SIGTERM', 'SIGKILL'], 5_000)
    expect((await ended)[1]).toBe('SIGTERM')
    expect(identity && isAlive(identity)).toBe(false)
  })
})
