import { describe, expect, inject, it } from 'vitest'
import { OSWIN, PHYSIO } from '../../seeds/demo/people'
import { SIZES, testBrowser } from '#tests/support/browser'
import { reportSoreJoint, SIGNED_OUT, signIn } from '#tests/support/journey'

describe('a red flag', () => {
  const browser = testBrowser()

  it('ends the swaps, tells the care team without a health word, and only the physio reopens it', async () => {
    const athlete = await browser.open('/today', { viewport: SIZES.phone, mayComplain: SIGNED_OUT })
    await signIn(athlete, OSWIN)
    await athlete.getByRole('button', { name: 'A joint is sore' }).waitFor()
    await reportSoreJoint(athlete, {
      joint: 'Right knee',
      rating: 5,
      provocation: 'Bending it under load',
      yes: /numbness/i,
    })
    await athlete
      .getByText(/clinician|emergency/i)
      .first()
      .waitFor()
    const close = athlete
      .getByRole('dialog')
      .getByRole('button', { name: /^(Close|Done|Back to today|I have read this)/ })
    if ((await close.count()) > 0) await close.first().click()

    await athlete.goto('/joints')
    await athlete.getByText('Right knee').first().waitFor()
    expect(await athlete.getByRole('button', { name: 'It no longer troubles me' }).count()).toBe(0)

    const mails = await fetch(inject('mailPageUrl'))
    const letters = await mails.text()
    expect(letters).toContain(PHYSIO.email)
    expect(letters).not.toMatch(/knee|numb|pain|5 of 10/i)

    const physio = await browser.open('/clients', { viewport: SIZES.desk, mayComplain: SIGNED_OUT })
    await signIn(physio, PHYSIO)
    await physio.getByRole('link', { name: OSWIN.name }).first().click()
    await physio
      .getByRole('button', { name: /Clear the red flag/ })
      .first()
      .click()
    await physio
      .getByLabel('What you examined, and why training may go on')
      .fill('Sensation and power examined today, both full.')
    await physio.getByRole('dialog').getByRole('button', { name: 'Clear the red flag' }).click()
    await physio
      .getByText(/red flag on the right knee is cleared/i)
      .first()
      .waitFor()

    await athlete.reload()
    await athlete.getByRole('button', { name: 'It no longer troubles me' }).first().waitFor()
  })
})
