import { existsSync, mkdirSync, readdirSync, writeFileSync } from 'node:fs'
import { say, SetupProblem } from './say.mjs'

const POSTGRES_VERSIONS = '/usr/lib/postgresql'
const POSTGRES_PACKAGE = 'postgresql-15'
const CLUSTER_SETTINGS = '/etc/postgresql-common/createcluster.conf'
const OLDEST_POSTGRES = 15

/**
 * The newest of the folder names that is a version we can use.
 * @param {string[]} versions
 */
export function pickPostgresVersion(versions) {
  return versions
    .map(Number)
    .filter((version) => version >= OLDEST_POSTGRES)
    .sort((a, b) => b - a)[0]
}

/**
 * The folder of PostgreSQL's programs: of the version asked for, or of the newest one installed.
 * @param {number} [version]
 * @returns {string | undefined}
 */
export function findPostgres(version) {
  const installed = existsSync(POSTGRES_VERSIONS) ? readdirSync(POSTGRES_VERSIONS) : []
  const usable = installed.filter((name) => existsSync(`${POSTGRES_VERSIONS}/${name}/bin/initdb`))
  const picked = version ?? pickPostgresVersion(usable)
  return picked && usable.includes(String(picked)) ? `${POSTGRES_VERSIONS}/${picked}/bin` : undefined
}

/** The browser the tests drive, or undefined. */
export function findChromium() {
  return [process.env.CHROMIUM ?? '', '/usr/bin/chromium'].find((path) => path !== '' && existsSync(path))
}

/**
 * The line an ordinary user asks an administrator to run. Debian would make a cluster of its own; we keep ours apart.
 * @param {string[]} packages
 */
export function installLine(packages) {
  const install = `apt-get update && apt-get install -y --no-install-recommends ${packages.join(' ')}`
  if (!packages.includes(POSTGRES_PACKAGE)) return `sudo sh -c '${install}'`
  const settings = `mkdir -p /etc/postgresql-common && echo "create_main_cluster = false" > ${CLUSTER_SETTINGS}`
  return `sudo sh -c '${settings} && ${install}'`
}

/**
 * Installs what is missing of Debian's packages, or says how.
 * @param {import('./run.mjs').Run} run
 * @param {{ chromium: boolean }} wanted
 */
export async function installSystemPackages(run, wanted) {
  const packages = []
  if (!findPostgres()) packages.push(POSTGRES_PACKAGE)
  if (wanted.chromium && !findChromium()) packages.push('chromium')
  if (packages.length === 0) return
  const line = installLine(packages)
  if (process.getuid?.() !== 0) {
    throw new SetupProblem(
      `Missing: ${packages.join(', ')}. An administrator installs it with this line:\n  ${line}`,
    )
  }
  if (!existsSync('/usr/bin/apt-get')) {
    throw new SetupProblem(`Missing: ${packages.join(', ')}. This command installs them on Debian only.`)
  }
  say(`Installing Debian's packages ${packages.join(' and ')} (a minute or two).`)
  if (packages.includes(POSTGRES_PACKAGE) && !existsSync(CLUSTER_SETTINGS)) {
    mkdirSync('/etc/postgresql-common', { recursive: true })
    writeFileSync(CLUSTER_SETTINGS, 'create_main_cluster = false\n')
  }
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive', LC_ALL: 'C.UTF-8' }
  const quiet = {
    env,
    stdio: /** @type {['ignore', 'ignore', 'inherit']} */ (['ignore', 'ignore', 'inherit']),
  }
  const patience = ['-o', 'DPkg::Lock::Timeout=300', '-o', 'Dpkg::Use-Pty=0']
  const install = [...patience, '-o', 'Dpkg::Options::=--force-confold', '-qq', 'install', '-y']
  install.push('--no-install-recommends', ...packages)
  // An installation that was cut off leaves half-configured packages, which stop every later one.
  await run.attempt('dpkg', ['--configure', '-a', '--force-confold'], quiet)
  await run.attempt('apt-get', [...patience, '-qq', 'update'], quiet)
  await run.finish('apt-get', install, {
    ...quiet,
    problem: `The packages could not be installed. Run this line and start again:\n  ${line}\n`,
  })
}
