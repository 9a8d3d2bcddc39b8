import type { Page } from 'playwright-core'
import { describe, it } from 'vitest'
import type { Today } from '#shared/contract/session'
import { ADMIN, ILSE, PHYSIO, YARD_COACH, type DemoPerson } from '../../seeds/demo/people'
import { SIZES, testBrowser } from '#tests/support/browser'
import { expectAccessible, settled, SIGNED_OUT, signIn } from '#tests/support/journey'

const ILSE_PAGE = `/athletes/${ILSE.id}`

const PAGES: Array<{ person: DemoPerson; paths: string[] }> = [
  { person: ILSE, paths: ['/today', '/joints', '/me', '/flags', '/catalogue/pull-up-overhand'] },
  { person: YARD_COACH, paths: ['/squad', '/catalogue', ILSE_PAGE, '/me'] },
  { person: PHYSIO, paths: ['/clients', ILSE_PAGE] },
  { person: ADMIN, paths: ['/flags', '/trail'] },
]

const visit = async (page: Page, path: string) => {
  await page.goto(path)
  await settled(page)
  await expectAccessible(page, path)
}

describe('every page is free of axe violations, in light and dark', () => {
  const browser = testBrowser()

  for (const [size, viewport] of Object.entries(SIZES)) {
    it(`signed out, ${size}`, async () => {
      const page = await browser.open('/sign-in', { viewport, mayComplain: SIGNED_OUT })
      for (const path of [
        '/sign-in',
        '/forgot-password',
        '/reset-password#token=not-a-true-token-at-all',
        '/no-such-page',
      ])
        await visit(page, path)
    })

    for (const { person, paths } of PAGES) {
      it(`${person.role}, ${size}`, async () => {
        const page = await browser.open('/sign-in', { viewport, mayComplain: SIGNED_OUT })
        await signIn(page, person)
        for (const path of paths) await visit(page, path)
      })
    }

    it(`the swap page and the sore-joint dialog, ${size}`, async () => {
      const page = await browser.open('/sign-in', { viewport, mayComplain: SIGNED_OUT })
      await signIn(page, ILSE)
      const day = new Date().toISOString().slice(0, 10)
      const today = (await (await page.request.get(`/api/athletes/${ILSE.id}/today?day=${day}`)).json()) as Today
      await visit(page, `/slots/${today.session?.slots[1]?.id}/swaps`)
      await page
        .getByRole('button', { name: /^(More|Open)/ })
        .first()
        .click()
      await page.getByText(/How \d+ comes about/).waitFor()
      await expectAccessible(page, 'an open swap')
      await page.goto('/today')
      await settled(page)
      await page.getByRole('button', { name: 'A joint is sore' }).click()
      await expectAccessible(page, 'the red-flag questions')
      for (const no of await page.getByRole('radio', { name: 'No', exact: true }).all()) await no.check()
      await page.getByRole('button', { name: 'Continue' }).click()
      await page.getByRole('group', { name: 'Body from the front' }).waitFor()
      await expectAccessible(page, 'the body chart')
    })
  }
})
