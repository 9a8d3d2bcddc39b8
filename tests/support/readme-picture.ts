/**
 * Takes the README's picture of the swap page from the built server and its demo:
 * `npx vite build && npx vite build -c vite.server.config.ts`, then `npx tsx tests/support/readme-picture.ts <database url>` with an
 * empty database.
 */
import { ILSE } from '../../seeds/demo/people'
import { launchBrowser } from './browser-launch'
import { startBuiltServer } from './built-server'
import { reportSoreJoint, settled, signIn } from './journey'

const PICTURE = 'tests/e2e/pictures/swap-page.png'

const [databaseUrl] = process.argv.slice(2)
if (databaseUrl === undefined) throw new Error('Name an empty database.')
const server = await startBuiltServer(databaseUrl)
const browser = await launchBrowser()
try {
  const page = await browser.newPage({
    baseURL: server.url,
    viewport: { width: 1280, height: 1420 },
    reducedMotion: 'reduce',
  })
  await page.goto('/today')
  await signIn(page, ILSE)
  await reportSoreJoint(page, { joint: 'Right elbow', rating: 4, provocation: 'Bending it under load' })
  await page.getByRole('link', { name: /swaps for Pull-up, overhand/i }).click()
  await page.getByLabel('Place').selectOption({ label: 'Saltmarsh room' })
  await page
    .getByRole('row')
    .filter({ hasText: 'Straight-arm cable pulldown' })
    .getByRole('button', { name: /^Open/ })
    .click()
  await page.getByText(/How \d+ comes about/).waitFor()
  await page.getByRole('button', { name: 'Close this message' }).click()
  await settled(page)
  await page.evaluate(() => window.scrollTo(0, 0))
  await page.screenshot({ path: PICTURE })
} finally {
  await browser.close()
  await server.stop()
}
