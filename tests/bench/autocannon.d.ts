/** The little of autocannon (version 9, written without types) that the measurements use. */
declare module 'autocannon' {
  interface Options {
    url: string
    connections: number
    /** Seconds. */
    duration: number
  }
  interface Result {
    requests: { average: number; total: number }
    errors: number
    timeouts: number
    non2xx: number
  }
  export default function autocannon(options: Options): Promise<Result>
}
