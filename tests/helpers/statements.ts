import type { PoolClient } from 'pg'
import type { QueryRunner } from 'typeorm'

/**
 * Counts the statements that reach the database through a query runner, by whatever way they go, and calls `afterEach` with the
 * count and the connection after each of them.
 */
export function countStatements(
  run: QueryRunner,
  afterEach: (count: number, client: PoolClient) => Promise<void> = async () => {},
): { count: () => number; restore: () => void } {
  let count = 0
  let restoreClient = () => {}
  const connect = run.connect.bind(run)
  const counting = (connect() as Promise<PoolClient>).then((client) => {
    const query = client.query.bind(client) as (...args: unknown[]) => Promise<unknown>
    const countingQuery = async (...args: unknown[]) => {
      const answer = await query(...args)
      count += 1
      await afterEach(count, client)
      return answer
    }
    client.query = countingQuery as typeof client.query
    restoreClient = () => {
      client.query = query as typeof client.query
    }
    return client
  })
  run.connect = () => counting
  return {
    count: () => count,
    restore: () => {
      restoreClient()
      run.connect = connect
    },
  }
}
