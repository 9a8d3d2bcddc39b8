import { existsSync } from 'node:fs'
import { chromium, type Browser } from 'playwright-core'

const FLAGS = [
  '--headless',
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
]
const PLACES = [process.env.CHROMIUM, '/usr/bin/chromium', '/usr/bin/chromium-browser', '/usr/bin/google-chrome']

/** Debian's chromium, or the one that CHROMIUM names. */
export function launchBrowser(): Promise<Browser> {
  const executablePath = PLACES.find((path) => path !== undefined && existsSync(path))
  if (executablePath === undefined) throw new Error('Chromium is missing: install it, or name it in CHROMIUM.')
  return chromium.launch({ executablePath, args: FLAGS })
}
