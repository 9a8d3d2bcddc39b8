import type { Browser, BrowserContextOptions, Page } from 'playwright-core'
import { afterAll, afterEach, beforeAll, expect, inject } from 'vitest'
import { launchBrowser } from './browser-launch'

export const SIZES = { phone: { width: 360, height: 740 }, desk: { width: 1280, height: 800 } } as const

/**
 * A browser for one test file; call it at the top and open pages of the demo inside tests. A page that complains in its
 * console, or asks for anything from elsewhere, fails its test. `mayComplain` names what is meant to happen.
 */
export function testBrowser(): {
  open(path: string, options?: BrowserContextOptions & { mayComplain?: RegExp }): Promise<Page>
} {
  let browser: Browser | undefined
  let complaints: string[] = []
  beforeAll(async () => {
    browser = await launchBrowser()
  })
  afterEach(async () => {
    const found = complaints
    complaints = []
    await Promise.all((browser?.contexts() ?? []).map((context) => context.close()))
    expect(found, 'complaints in the browser’s console').toEqual([])
  })
  afterAll(async () => {
    await browser?.close()
  })
  return {
    async open(path, { mayComplain, ...options } = {}) {
      if (browser === undefined) throw new Error('testBrowser() opens pages inside tests only.')
      const baseURL = inject('baseUrl')
      const context = await browser.newContext({ baseURL, viewport: SIZES.desk, reducedMotion: 'reduce', ...options })
      const page = await context.newPage()
      const complain = (text: string) => {
        if (mayComplain?.test(text) !== true) complaints.push(text)
      }
      page.on('console', (message) => {
        if (message.type() === 'error') complain(message.text())
      })
      page.on('pageerror', (error) => complain(error.message))
      page.on('request', (request) => {
        if (/^https?:/.test(request.url()) && !request.url().startsWith(baseURL)) complain(`asked for ${request.url()}`)
      })
      await page.goto(path)
      return page
    },
  }
}
