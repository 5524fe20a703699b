import { createServer } from 'node:net'
import { describe, expect, test } from 'vitest'
import { choosePort, findFreePort, parsePort, tryPort } from '../../../server/setup/ports.mjs'

/** Answers as if exactly these ports were taken. */
const taken =
  (...ports: number[]) =>
  (port: number) =>
    Promise.resolve(ports.includes(port) ? undefined : port)

describe('the port asked for', () => {
  test('is none when PORT is missing or empty', () => {
    expect(parsePort(undefined)).toBeUndefined()
    expect(parsePort('')).toBeUndefined()
  })

  test.each([
    ['1', 1],
    ['8080', 8080],
    ['65535', 65535],
  ])('reads %s', (text, port) => {
    expect(parsePort(text)).toBe(port)
  })

  test.each(['0', '65536', '-1', '80.5', 'http', ' 80', '1e3'])('refuses "%s" with a sentence', (text) => {
    expect(() => parsePort(text)).toThrow('PORT must be a whole number from 1 to 65535')
  })
})

describe('choosing a port', () => {
  test('takes the usual one when it is free', async () => {
    expect(await choosePort(undefined, 8080, taken())).toBe(8080)
  })

  test('goes on to the next free one when nobody asked for a certain one', async () => {
    expect(await choosePort(undefined, 8080, taken(8080, 8081))).toBe(8082)
  })

  test('never takes another than the one asked for', async () => {
    expect(await choosePort(9000, 8080, taken(8080))).toBe(9000)
    await expect(choosePort(9000, 8080, taken(9000))).rejects.toThrow('Port 9000 is in use')
  })

  test('gives up with a sentence after fifty', async () => {
    await expect(choosePort(undefined, 8080, () => Promise.resolve(undefined))).rejects.toThrow(
      '8080 to 8129',
    )
  })

  test('sees a port that is really taken', async () => {
    const port = await findFreePort()
    const server = createServer()
    await new Promise<void>((resolve) => server.listen(port, '127.0.0.1', resolve))
    expect(await tryPort(port)).toBeUndefined()
    await new Promise((resolve) => server.close(resolve))
    expect(await tryPort(port)).toBe(port)
  })
})
