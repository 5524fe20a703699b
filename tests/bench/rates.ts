import autocannon from 'autocannon'
import { median } from './statistics.js'

const CONNECTIONS = 10
const WARM_UP_SECONDS = 2
const ROUND_SECONDS = 3
const ROUNDS = 5

export interface Rates {
  /** Requests a second, the median of the rounds. */
  first: number
  second: number
  /** First by second, the median of the rounds' own ratios, so that a machine that is slow for a while is slow for both. */
  ratio: number
}

async function measure(url: string, seconds: number): Promise<number> {
  const { requests, errors, timeouts, non2xx } = await autocannon({
    url,
    connections: CONNECTIONS,
    duration: seconds,
  })
  if (errors + timeouts + non2xx > 0 || requests.total === 0) throw new Error(`${url} did not answer well.`)
  return requests.average
}

/** Requests a second of two addresses, measured by turns in one run. */
export async function compareRates(firstUrl: string, secondUrl: string): Promise<Rates> {
  await measure(firstUrl, WARM_UP_SECONDS)
  await measure(secondUrl, WARM_UP_SECONDS)
  const rounds: { first: number; second: number }[] = []
  for (let round = 0; round < ROUNDS; round += 1) {
    const first = await measure(firstUrl, ROUND_SECONDS)
    const second = await measure(secondUrl, ROUND_SECONDS)
    rounds.push({ first, second })
  }
  return {
    first: median(rounds.map((round) => round.first)),
    second: median(rounds.map((round) => round.second)),
    ratio: median(rounds.map(({ first, second }) => first / second)),
  }
}
