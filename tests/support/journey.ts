import { AxeBuilder } from '@axe-core/playwright'
import type { Page } from 'playwright-core'
import { expect } from 'vitest'
import { DEMO_PASSWORDS, type DemoPerson } from '../../seeds/demo/people'

/** Not being signed in yet is an answer of the API that browsers write into the console. */
export const SIGNED_OUT = /status of 401/

/** Signs in on the page as a person would, and waits until their first page stands. */
export async function signIn(page: Page, person: Pick<DemoPerson, 'email' | 'role'>): Promise<void> {
  await page.getByLabel('E-mail').fill(person.email)
  await page.getByLabel('Password', { exact: true }).fill(DEMO_PASSWORDS[person.role])
  await page.getByRole('button', { name: 'Sign in', exact: true }).click()
  await page.waitForURL((url) => !url.pathname.startsWith('/sign-in'))
  await page.getByRole('heading', { level: 1 }).waitFor()
}

/** Waits until nothing on the page is still loading or moving. */
export async function settled(page: Page): Promise<void> {
  // Behind an open dialog the heading is there, but hidden from the roles.
  await page.locator('h1').first().waitFor({ state: 'attached' })
  await page.waitForLoadState('networkidle')
  await page.waitForFunction(
    () =>
      document.querySelector('[aria-busy="true"]') === null &&
      document.getAnimations().every((animation) => animation.playState !== 'running'),
  )
}

/** No violation of WCAG 2.2 AA, in light and in dark, and nothing wider than the screen. */
export async function expectAccessible(page: Page, what: string): Promise<void> {
  for (const colorScheme of ['light', 'dark'] as const) {
    await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' })
    await settled(page)
    const { violations } = await new AxeBuilder({ page })
      .withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice'])
      .analyze()
    const found = violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ target }) => target.join(' ')).join(', ')}`)
    expect(found, `${what} in ${colorScheme}`).toEqual([])
  }
  const overhang = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth)
  expect(overhang, `${what} is wider than the screen`).toBeLessThanOrEqual(0)
}

/** The athlete's report of a sore joint, through the dialog, with every red-flag question answered no unless named. */
export async function reportSoreJoint(
  page: Page,
  report: { joint: string; rating: number; provocation: string; yes?: RegExp },
): Promise<void> {
  await page.getByRole('button', { name: 'A joint is sore' }).click()
  const dialog = page.getByRole('dialog')
  for (const question of await dialog.getByRole('radiogroup').or(dialog.locator('fieldset')).all()) {
    const yes = report.yes !== undefined && report.yes.test((await question.textContent()) ?? '')
    await question.getByRole('radio', { name: yes ? 'Yes' : 'No', exact: true }).check()
  }
  await dialog.getByRole('button', { name: 'Continue' }).click()
  await dialog.getByRole('group', { name: 'Body from the front' }).getByRole('button', { name: report.joint }).click()
  await dialog.getByRole('radio', { name: String(report.rating), exact: true }).check()
  await dialog.getByRole('checkbox', { name: report.provocation }).check()
  await dialog.getByRole('button', { name: 'Save the report' }).click()
}
