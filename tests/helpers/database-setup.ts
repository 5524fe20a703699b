import type { TestProject } from 'vitest/node'
import { migrate } from '../../server/migrate.js'
import { startTestCluster } from './cluster.js'

declare module 'vitest' {
  interface ProvidedContext {
    /** Addresses of the throw-away cluster; `{database}` stands for the name of a copy. */
    testCluster: { superuserUrl: string; template: string; ownerPattern: string; appPattern: string }
  }
}

/** Starts the cluster that the test files of a project share, each with a database of its own, and ends it after. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const { superuserUrl, template, reach, stop } = await startTestCluster(migrate)
  const { owner, app } = reach('{database}')
  project.provide('testCluster', { superuserUrl, template, ownerPattern: owner, appPattern: app })
  return stop
}
