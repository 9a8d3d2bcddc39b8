import { describe, expect, inject, it } from 'vitest'
import { ADMIN, ILSE, PHYSIO, ROOM_COACH, YARD_COACH } from '../../seeds/demo/people'
import { SIZES, testBrowser } from '#tests/support/browser'
import { settled, SIGNED_OUT, signIn } from '#tests/support/journey'

/** Where the newest reset letter leads, from the page that shows the mails. */
async function resetLink(): Promise<string | undefined> {
  const pageUrl = inject('mailPageUrl')
  const list = await (await fetch(pageUrl)).text()
  const letter = /href="(\/mails\/[^"]+)">[^<]*password/i.exec(list)?.[1]
  if (letter === undefined) return undefined
  const text = await (await fetch(new URL(letter, pageUrl))).text()
  return /\/reset-password#token=[\w-]+/.exec(text)?.[0]
}

describe('coach, physio and admin', () => {
  const browser = testBrowser()

  it('a coach sees the squad, an athlete’s day and its swaps, and is shut out when consent ends', async () => {
    const coach = await browser.open('/squad', { mayComplain: SIGNED_OUT })
    await signIn(coach, YARD_COACH)
    await coach.getByRole('link', { name: ILSE.name }).first().click()
    await coach.getByText('Pull-up, overhand').first().waitFor()
    const address = coach.url()

    const athlete = await browser.open('/me', { viewport: SIZES.phone, mayComplain: SIGNED_OUT })
    await signIn(athlete, ILSE)
    await athlete.goto('/me')
    const letIn = athlete.getByRole('switch', { name: new RegExp(YARD_COACH.name) })
    await letIn.click()
    await athlete
      .getByRole('dialog')
      .or(athlete.getByRole('alertdialog'))
      .getByRole('button', { name: /Shut out/i })
      .click()
    await expect.poll(() => letIn.getAttribute('aria-checked')).toBe('false')

    const shutOut = await browser.open('/squad', { mayComplain: /status of 40[14]/ })
    await signIn(shutOut, YARD_COACH)
    await settled(shutOut)
    expect(await shutOut.getByRole('link', { name: ILSE.name }).count()).toBe(0)
    await shutOut.goto(address)
    await shutOut.getByText('This athlete has not let you in.').waitFor()

    await letIn.click()
    await expect.poll(() => letIn.getAttribute('aria-checked')).toBe('true')
  })

  it('a coach looks an exercise up in the catalogue and reads what it asks', async () => {
    const page = await browser.open('/catalogue', { mayComplain: SIGNED_OUT })
    await signIn(page, ROOM_COACH)
    await page.goto('/catalogue')
    await page
      .getByRole('searchbox')
      .or(page.getByLabel(/Search/))
      .first()
      .fill('leg press')
    await page.getByRole('link', { name: 'Leg press, 45°', exact: true }).first().click()
    await page.getByRole('heading', { level: 1, name: 'Leg press, 45°' }).waitFor()
    await page
      .getByText(/straightening of the knee|quadriceps|vast/i)
      .first()
      .waitFor()
  })

  it('a physio sees clients in the order of need', async () => {
    const page = await browser.open('/clients', { mayComplain: SIGNED_OUT })
    await signIn(page, PHYSIO)
    await page.getByRole('heading', { level: 1, name: 'Clients' }).waitFor()
    await page.getByRole('link', { name: ILSE.name }).first().waitFor()
  })

  it('an admin reads flags and the trail, and no athlete’s health', async () => {
    const page = await browser.open('/flags', { mayComplain: SIGNED_OUT })
    await signIn(page, ADMIN)
    await page.getByRole('heading', { level: 1, name: 'Flags' }).waitFor()
    await page.getByRole('link', { name: 'Trail' }).first().click()
    await page.getByRole('heading', { level: 1, name: 'Trail' }).waitFor()
    await settled(page)
    expect(await page.getByRole('main').innerText()).not.toMatch(/\d of 10|numb/i)
  })

  it('a forgotten password is set anew through the mail', async () => {
    const page = await browser.open('/forgot-password', { mayComplain: SIGNED_OUT })
    await page.getByLabel('E-mail').fill(ROOM_COACH.email)
    await page.getByRole('button', { name: /Send/ }).click()
    await page
      .getByText(/if .*address/i)
      .first()
      .waitFor()
    await expect.poll(() => resetLink()).toMatch(/^\/reset-password#token=/)
    await page.goto((await resetLink()) ?? '')
    const next = 'a quite new password'
    await page.getByLabel('New password').fill(next)
    await page.getByRole('button', { name: 'Set the new password' }).click()
    await page.waitForURL('**/sign-in*')
    await page.getByLabel('E-mail').fill(ROOM_COACH.email)
    await page.getByLabel('Password', { exact: true }).fill(next)
    await page.getByRole('button', { name: 'Sign in', exact: true }).click()
    await page.waitForURL('**/squad')
  })
})
