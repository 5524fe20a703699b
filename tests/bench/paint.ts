import lighthouse from 'lighthouse'
import { median } from './statistics.js'

const ROUNDS = 3

/** Largest contentful paint in ms on the throttled phone that Lighthouse stands for (slow 4G, a quarter of the processor). */
async function measurePaint(url: string, port: number): Promise<number> {
  const result = await lighthouse(url, {
    port,
    output: 'json',
    logLevel: 'silent',
    formFactor: 'mobile',
    throttlingMethod: 'devtools',
    onlyAudits: ['largest-contentful-paint'],
  })
  const paint = result?.lhr.audits['largest-contentful-paint']?.numericValue
  if (paint === undefined)
    throw new Error(`${url} was not painted: ${result?.lhr.runtimeError?.message ?? ''}`)
  return paint
}

/** Largest contentful paint of two addresses by turns, median in ms, and the median of the rounds' ratios. */
export async function comparePaints(
  firstUrl: string,
  secondUrl: string,
  port: number,
): Promise<{ first: number; second: number; ratio: number }> {
  const rounds: { first: number; second: number }[] = []
  for (let round = 0; round < ROUNDS; round += 1) {
    const first = await measurePaint(firstUrl, port)
    const second = await measurePaint(secondUrl, port)
    rounds.push({ first, second })
  }
  return {
    first: median(rounds.map((round) => round.first)),
    second: median(rounds.map((round) => round.second)),
    ratio: median(rounds.map(({ first, second }) => first / second)),
  }
}
