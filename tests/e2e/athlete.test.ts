import { describe, expect, it } from 'vitest'
import { ILSE } from '../../seeds/demo/people'
import { SIZES, testBrowser } from '#tests/support/browser'
import { reportSoreJoint, settled, SIGNED_OUT, signIn } from '#tests/support/journey'

describe('an athlete with a sore elbow', () => {
  const browser = testBrowser()

  it('marks it, reads ranked swaps, takes one, takes it back, flags another and closes the report, on a phone', async () => {
    const page = await browser.open('/today', { viewport: SIZES.phone, hasTouch: true, mayComplain: SIGNED_OUT })
    await signIn(page, ILSE)
    await page.getByRole('heading', { name: 'Pull-up, overhand' }).waitFor()
    await reportSoreJoint(page, { joint: 'Right elbow', rating: 4, provocation: 'Bending it under load' })
    const pullUp = page.getByRole('listitem').filter({ hasText: 'Pull-up, overhand' })
    await pullUp.getByText(/Right elbow would reach \d+\s%, cap 50\s%/).waitFor()

    await pullUp.getByRole('link', { name: /swaps/ }).click()
    await page.getByText('Training information, not a diagnosis and not medical advice.').waitFor()
    const cards = page.getByRole('main').getByRole('listitem').filter({ hasText: 'Take for today' })
    await cards.first().waitFor()
    const scores = (await cards.allInnerTexts()).map((text) => Number(/(\d+)\s+points/.exec(text)?.[1]))
    expect(scores.length).toBeGreaterThan(2)
    expect(scores).toEqual([...scores].sort((a, b) => b - a))

    await page.getByText('Filters').click()
    await page.getByLabel('Place').selectOption({ label: 'Saltmarsh room' })
    await cards.filter({ hasText: 'Padded pullover machine' }).waitFor()
    await page.getByText(/Left out, \d+, each with its reason/).click()
    await page
      .getByText(/Right elbow at \d+\s% even with body weight alone; the cap is 50\s%/)
      .first()
      .waitFor()

    await cards.first().getByRole('button', { name: /^More/ }).click()
    await page
      .getByText(/gives? out/)
      .first()
      .waitFor()
    await page.getByRole('button', { name: 'Flag this swap' }).click()
    await page.getByRole('dialog').getByRole('radio').first().check()
    await page.getByRole('button', { name: 'Send the flag' }).click()
    await page.getByRole('dialog').waitFor({ state: 'detached' })

    await cards.first().getByRole('button', { name: /^Take/ }).first().click()
    await page.waitForURL('**/today')
    await page.getByText(/instead of Pull-up, overhand/).waitFor()
    await page.getByRole('button', { name: 'Undo the swap' }).click()
    await page.getByText(/instead of Pull-up, overhand/).waitFor({ state: 'detached' })

    await page.getByRole('link', { name: 'Joints', exact: true }).click()
    await page.getByRole('button', { name: 'It no longer troubles me' }).click()
    await page.getByText('Right elbow closed.').first().waitFor()
  })

  it('sorts the table by any column and keeps the filters in the address, at a desk, by keyboard alone', async () => {
    const page = await browser.open('/today', { viewport: SIZES.desk, mayComplain: SIGNED_OUT })
    await signIn(page, ILSE)
    await page.getByRole('link', { name: /See swaps for Pull-up, overhand/ }).press('Enter')
    const table = page.getByRole('table').first()
    await table.waitFor()
    await page.getByLabel('Place').selectOption({ label: 'Saltmarsh room' })
    await page.waitForURL(/place=/)
    const elbow = page.getByRole('columnheader', { name: /Elbow/ })
    await elbow.getByRole('button').press('Enter')
    await expect.poll(() => elbow.getAttribute('aria-sort')).toMatch(/ascending|descending/)
    await page.reload()
    await settled(page)
    expect(await page.getByLabel('Place').locator('option:checked').textContent()).toBe('Saltmarsh room')
  })
})
