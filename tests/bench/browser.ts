import { chromium, type Browser } from 'playwright'
import { findFreePort } from '../../server/setup/ports.mjs'

const QUIET = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
]

/** Starts the browser of the measurements; its port is where other tools reach it. */
export async function startBrowser(): Promise<{ browser: Browser; port: number }> {
  const port = await findFreePort()
  const browser = await chromium.launch({
    executablePath: process.env.CHROMIUM ?? '/usr/bin/chromium',
    args: [...QUIET, `--remote-debugging-port=${port}`],
  })
  return { browser, port }
}
