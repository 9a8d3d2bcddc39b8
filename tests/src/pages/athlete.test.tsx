import { screen, within } from '@testing-library/react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { Component as AthletePage } from '@/pages/athlete'
import { fakeApi, Refusal, type Sent } from '#tests/src/support/api'
import { renderPage } from '#tests/src/support/render'
import { aList, aPerson, aRedFlag, aSession, aSlot, aToday } from '#tests/src/support/samples'

afterEach(() => vi.unstubAllGlobals())

const physio = aPerson({
  name: 'Noor Vesely',
  memberships: [{ clubId: 'c', clubName: 'Quarry Lane', role: 'physio' }],
  body: null,
})
const flagged = aRedFlag({ can: { close: false, clear: true } })

function open(handlers: Parameters<typeof fakeApi>[0] = {}) {
  const api = fakeApi({
    'GET /api/athletes/a1/today': aToday(aSession({ slots: [aSlot({ can: { swap: false } })] })),
    'GET /api/athletes/a1/sore-joints': ({ query }: Sent) => (query.state === 'standing' ? aList(flagged) : aList()),
    'GET /api/exercises': aList(),
    ...handlers,
  })
  return {
    api,
    ...renderPage(<AthletePage />, { person: physio, path: '/athletes/a1', route: '/athletes/:athleteId' }),
  }
}

describe('an athlete’s page', () => {
  it('shows their day without what the reader may not do', async () => {
    open()
    expect(await screen.findByRole('heading', { level: 1, name: 'Ilse Tamm' })).toBeInTheDocument()
    const card = screen.getByRole('heading', { name: 'Pull-up, overhand' }).closest('li')!
    expect(within(card).queryByRole('link')).not.toBeInTheDocument()
  })

  it('says so when the athlete has not let the reader in', async () => {
    open({ 'GET /api/athletes/a1/today': new Refusal(404, 'not_found') })
    expect(await screen.findByText('This athlete has not let you in.')).toBeInTheDocument()
  })
})

describe('clearing a red flag', () => {
  const CLEAR = `POST /api/athletes/a1/sore-joints/${flagged.id}/clearance`

  it('needs a note of what was examined', async () => {
    const { api, user } = open()
    await user.click(await screen.findByRole('button', { name: 'Clear the red flag' }))
    const dialog = await screen.findByRole('dialog')
    await user.click(within(dialog).getByRole('button', { name: 'Clear the red flag' }))
    expect(await within(dialog).findByText('Write what you examined and why training may go on.')).toBeInTheDocument()
    expect(api.to(CLEAR)).toEqual([])
  })

  it('sends the note and says so', async () => {
    const { api, user } = open({ [CLEAR]: flagged })
    await user.click(await screen.findByRole('button', { name: 'Clear the red flag' }))
    const dialog = await screen.findByRole('dialog')
    await user.type(within(dialog).getByRole('textbox'), 'No swelling, full range.')
    await user.click(within(dialog).getByRole('button', { name: 'Clear the red flag' }))
    expect(await screen.findByText('The red flag on the right elbow is cleared.')).toBeInTheDocument()
    expect(api.to(CLEAR)[0]?.body).toEqual({ note: 'No swelling, full range.' })
  })
})
